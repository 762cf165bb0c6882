"use client";

import { Button } from "@/components/ui/button";
import { shortMoment } from "@/components/ui/dates";
import { useAct } from "@/components/ui/use-act";
import { roleName } from "@/lib/notify/roles";
import type { InvitationView } from "@/lib/notify/views";
import type { TeamActs } from "./acts";

/** An invitation not yet taken up. */
export function InvitationRow({ invitation, act }: { invitation: InvitationView; act: TeamActs["withdraw"] | null }) {
  return (
    <tr>
      <td className="desk__site">{invitation.email}</td>
      <td>{invitation.roles.map((role) => roleName[role]).join(", ")}</td>
      <td>{invitation.invitedBy}</td>
      <td className="quiet">{shortMoment(invitation.expiresAt)}</td>
      <td>{act && <Withdraw invitation={invitation} act={act} />}</td>
    </tr>
  );
}

function Withdraw({ invitation, act }: { invitation: InvitationView; act: TeamActs["withdraw"] }) {
  const { state, pending, run } = useAct(act);
  return (
    <>
      <Button kind="plain" disabled={pending} onClick={() => run({ id: invitation.id })}>
        Withdraw<span className="vh"> the invitation to {invitation.email}</span>
      </Button>
      {state.status === "failed" && <span role="alert"> {state.message}</span>}
    </>
  );
}
