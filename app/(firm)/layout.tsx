import type { ReactNode } from "react";
import { signOutAct } from "@/app/(account)/actions";
import { Margin } from "@/components/frame/margin";
import { PhoneBar } from "@/components/frame/phone-bar";
import { SignOut } from "@/components/frame/sign-out";
import { counts } from "@/db/queries/jobs";
import { rolesInWords } from "@/lib/notify/roles";
import { requireViewer } from "@/lib/server/auth/viewer";

/** Every page of a firm: the ledger margin on a desk, a bar with a menu on a phone. */
export default async function FirmLayout({ children }: { children: ReactNode }) {
  const viewer = await requireViewer();
  const counted = await counts(viewer);
  const shown = counted.ok ? counted.value : null;
  return (
    <div className="office">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <Margin
        counts={shown}
        name={viewer.name}
        held={viewer.roles}
        firmName={viewer.firmName}
        signOut={<SignOut act={signOutAct} />}
      />
      <PhoneBar
        counts={shown}
        held={viewer.roles}
        who={`${viewer.name}. ${rolesInWords(viewer.roles)}. ${viewer.firmName}`}
        signOut={<SignOut act={signOutAct} />}
      />
      {children}
    </div>
  );
}
