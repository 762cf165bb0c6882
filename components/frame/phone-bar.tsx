"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { useEffect, useRef, type ReactNode } from "react";
import { BrandSign, MenuIcon } from "@/components/ui/icons";
import type { Role } from "@/lib/notify/roles";
import type { Counts } from "@/lib/notify/views";
import { liesIn, placesFor } from "./contents";

type Props = { counts: Counts | null; held: readonly Role[]; who: ReactNode; signOut: ReactNode };

/** The phone's top bar: the sign leads home, the menu holds the contents list. */
export function PhoneBar({ counts, held, who, signOut }: Props) {
  const pathname = usePathname();
  const menu = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    if (menu.current) menu.current.open = false;
  }, [pathname]);
  return (
    <header className="phonebar">
      <div className="phonebar__top">
        <Link href="/">
          <BrandSign />
          Sealwire
        </Link>
        <details ref={menu}>
          <summary>
            Menu <MenuIcon />
          </summary>
          <div className="phonemenu">
            <nav aria-label="Contents">
              <ul>
                {placesFor(held)
                  .flat()
                  .map(({ href, name, count }) => (
                    <li key={href}>
                      <Link href={href} aria-current={liesIn(pathname, href) ? "page" : undefined}>
                        {name}
                        {count && counts && <span>{counts[count].toLocaleString("en-GB")}</span>}
                      </Link>
                    </li>
                  ))}
                <li>
                  <Link href="/account" aria-current={liesIn(pathname, "/account") ? "page" : undefined}>
                    Your account
                  </Link>
                </li>
              </ul>
            </nav>
            <p>{who}</p>
            {signOut}
          </div>
        </details>
      </div>
    </header>
  );
}
