import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { BrandSign } from "@/components/ui/icons";
import { VerifyPack } from "@/components/verify/verify-pack";

export const metadata: Metadata = { title: "Check a pack’s seal" };

export default function VerifyPage() {
  return (
    <div className="office">
      <nav className="margin" aria-label="Contents">
        <Link className="margin__brand" href="/sign-in">
          <BrandSign />
          Sealwire
        </Link>
        <ul className="placelist">
          <li>
            <Link href="/verify" aria-current="page">
              Check a pack
            </Link>
          </li>
          <li>
            <a href="#by-hand">Check by hand</a>
          </li>
        </ul>
        <ul className="placelist">
          <li>
            <Link href="/sign-in">Sign in</Link>
          </li>
        </ul>
        <p className="margin__who quiet">No account is needed to check a pack.</p>
      </nav>
      <header className="phonebar">
        <div className="phonebar__top">
          <Link href="/sign-in">
            <BrandSign />
            Sealwire
          </Link>
        </div>
      </header>
      <main id="main">
        <PageHead title="Check a pack’s seal" say="The pack is read on this device. No file leaves it." />
        <div className="sheet verify-sheet">
          <VerifyPack />
          <section className="by-hand" id="by-hand" aria-labelledby="by-hand-title">
            <h2 id="by-hand-title">Check by hand</h2>
            <p>
              Unpack the zip and run <code className="mono">sha256sum -c SHA256SUMS</code> in its folder. Every line
              must end in OK. On Windows, <code className="mono">Get-FileHash</code> gives the hash of one file, to lay
              beside its line in <code className="mono">SHA256SUMS</code>.
            </p>
          </section>
        </div>
      </main>
    </div>
  );
}
