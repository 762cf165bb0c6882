import type { Metadata, Route } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { SessionList } from "@/components/account/session-list";
import { Section } from "@/components/ui/section";
import { listSessions } from "@/db/queries/account";
import { roleName } from "@/lib/notify/roles";
import { currentSession, requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";
import { endSessionAct, signOutEverywhereAct } from "./actions";

export const metadata: Metadata = { title: "Your account" };

export default async function AccountPage() {
  const viewer = await requireViewer();
  const session = await currentSession();
  const sessions = valueOf(await listSessions(viewer, { currentId: session?.sessionId ?? null }));
  return (
    <main id="main" className="deskmain">
      <PageHead title="Your account" say={`${viewer.name}, ${viewer.firmName}.`} />
      <div className="sheet page-body page-body--two">
        <Section title="Where you are signed in" id="sessions">
          <SessionList sessions={sessions} end={endSessionAct} endAll={signOutEverywhereAct} />
        </Section>
        <Section title="You" id="you">
          <dl className="facts">
            <div>
              <dt>Name</dt>
              <dd>{viewer.name}</dd>
            </div>
            <div>
              <dt>E-mail</dt>
              <dd>{viewer.email}</dd>
            </div>
            <div>
              <dt>Roles</dt>
              <dd>{viewer.roles.map((role) => roleName[role]).join(", ")}</dd>
            </div>
            <div>
              <dt>Password</dt>
              <dd>
                <Link href={"/forgotten" as Route}>Change it by a link sent to your address</Link>
              </dd>
            </div>
          </dl>
        </Section>
      </div>
    </main>
  );
}
