"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import type { Role } from "@/lib/notify/roles";
import type { Counts } from "@/lib/notify/views";
import { liesIn, placesFor } from "./contents";

/** The contents list of the ledger margin, with its counts; the current place is a tab that joins the sheet. */
export function ContentsList({ counts, held }: { counts: Counts | null; held: readonly Role[] }) {
  const pathname = usePathname();
  return placesFor(held).map((places, group) => (
    <ul key={group} className="placelist">
      {places.map(({ href, name, count }) => (
        <li key={href}>
          <Link href={href} aria-current={liesIn(pathname, href) ? "page" : undefined}>
            {name}
            {count && counts && (
              <>
                <i aria-hidden="true" />
                <b>{counts[count].toLocaleString("en-GB")}</b>
              </>
            )}
          </Link>
        </li>
      ))}
    </ul>
  ));
}
