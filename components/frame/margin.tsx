import Link from "next/link";
import type { ReactNode } from "react";
import { BrandSign } from "@/components/ui/icons";
import { rolesInWords, type Role } from "@/lib/notify/roles";
import type { Counts } from "@/lib/notify/views";
import { ContentsList } from "./contents-list";

type Props = { counts: Counts | null; name: string; held: readonly Role[]; firmName: string; signOut: ReactNode };

/** The ledger margin of a desk screen: the contents list above, who is at work below. */
export function Margin({ counts, name, held, firmName, signOut }: Props) {
  return (
    <nav className="margin" aria-label="Contents">
      <Link className="margin__brand" href="/">
        <BrandSign />
        Sealwire
      </Link>
      <ContentsList counts={counts} held={held} />
      <div className="margin__who">
        <Link className="strong" href="/account">
          {name}
        </Link>
        <p className="quiet">
          {rolesInWords(held)}
          <br />
          {firmName}
        </p>
        {signOut}
      </div>
    </nav>
  );
}
