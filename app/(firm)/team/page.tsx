import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import type { TeamActs } from "@/components/team/acts";
import { FirmForm } from "@/components/team/firm-form";
import { InvitationRow } from "@/components/team/invitation-row";
import { InviteForm } from "@/components/team/invite-form";
import { MemberRow } from "@/components/team/member-row";
import { counted } from "@/components/ui/counted";
import { Section } from "@/components/ui/section";
import { getFirm } from "@/db/queries/firms";
import { listTeam } from "@/db/queries/team";
import { may } from "@/lib/notify/permissions";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";
import { inviteAct, saveFirmAct, setRolesAct, setStatusAct, withdrawAct } from "./actions";

export const metadata: Metadata = { title: "Team" };

const acts: TeamActs = { invite: inviteAct, setRoles: setRolesAct, setStatus: setStatusAct, withdraw: withdrawAct };

export default async function TeamPage() {
  const viewer = await requireViewer();
  const [team, facts] = await Promise.all([listTeam(viewer), getFirm(viewer)]);
  const { members, invitations } = valueOf(team);
  const firm = valueOf(facts);
  const manages = may(viewer.roles, "team.manage");
  return (
    <main id="main" className="deskmain">
      <PageHead
        title="Team"
        say={`${counted(members.length, "person", "people")}. A change of role acts at the person’s next request.`}
      />
      <div className="sheet">
        <table className="desk desk--team">
          <caption className="vh">People of {viewer.firmName}</caption>
          <thead>
            <tr>
              <th>Name</th>
              <th>E-mail</th>
              <th>Roles</th>
              <th>Registration</th>
              <th>Standing</th>
              <th>Last seen</th>
              <th>
                <span className="vh">Change</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {members.map((member) => (
              <MemberRow
                key={member.userId}
                member={member}
                you={member.userId === viewer.userId}
                acts={manages ? acts : null}
              />
            ))}
          </tbody>
        </table>
        <div className="page-body page-body--two">
          <Section title="The firm" id="firm">
            <FirmForm firm={firm} act={saveFirmAct} readOnly={!may(viewer.roles, "firm.manage")} />
          </Section>
          <div className="stack">
            {manages && (
              <Section title="Invite somebody" id="invite">
                <InviteForm act={inviteAct} />
              </Section>
            )}
            <Section title="Invitations not taken up" id="invitations">
              {invitations.length === 0 ? (
                <p className="quiet">None.</p>
              ) : (
                <table className="ledger">
                  <thead>
                    <tr>
                      <th>E-mail</th>
                      <th>Roles</th>
                      <th>Invited by</th>
                      <th>Runs out</th>
                      <th>
                        <span className="vh">Withdraw</span>
                      </th>
                    </tr>
                  </thead>
                  <tbody>
                    {invitations.map((invitation) => (
                      <InvitationRow key={invitation.id} invitation={invitation} act={manages ? withdrawAct : null} />
                    ))}
                  </tbody>
                </table>
              )}
            </Section>
          </div>
        </div>
      </div>
    </main>
  );
}
