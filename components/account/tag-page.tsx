import Link from "next/link";
import type { ReactNode } from "react";
import { BrandSign } from "@/components/ui/icons";
import { SignInWire, TagEyelet } from "./sign-in-wire";

/** A page for somebody who has no session: one short form on a job tag hung on the wire. */
export function TagPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="sign-in">
      <header>
        <Link className="sign-in__brand" href="/sign-in">
          <BrandSign size={40} />
          Sealwire
        </Link>
      </header>
      <aside aria-label="The thread of a job">
        <SignInWire />
        <p className="sign-in__line">A sealed pack shows what left your hands, and that nobody has altered it since.</p>
      </aside>
      <main className="tag" id="main">
        <span className="tag__shape" />
        <TagEyelet />
        <h1>{title}</h1>
        {children}
      </main>
      <footer>
        <Link className="sign-in__check" href="/verify">
          Check a pack’s seal
        </Link>
      </footer>
    </div>
  );
}
