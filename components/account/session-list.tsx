"use client";

import { Button } from "@/components/ui/button";
import { shortMoment } from "@/components/ui/dates";
import { useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";
import type { SessionView } from "@/lib/notify/views";

type Act = (input: unknown) => Promise<ActionState<unknown>>;

/** Where one is signed in; any of them can be ended. */
export function SessionList({ sessions, end, endAll }: { sessions: SessionView[]; end: Act; endAll: Act }) {
  const all = useAct(endAll);
  return (
    <>
      <table className="ledger">
        <thead>
          <tr>
            <th>Device</th>
            <th>Last seen</th>
            <th>Signed in</th>
            <th>
              <span className="vh">End</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {sessions.map((session) => (
            <tr key={session.id}>
              <td>
                {session.device}
                {session.current && <b className="strong">, this one</b>}
              </td>
              <td>{shortMoment(session.lastSeenAt)}</td>
              <td>{shortMoment(session.createdAt)}</td>
              <td>{!session.current && <EndOne session={session} act={end} />}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="form__acts">
        <Button disabled={all.pending} onClick={() => all.run({})}>
          Sign out everywhere
        </Button>
        {all.state.status === "failed" && <p role="alert">{all.state.message}</p>}
      </div>
    </>
  );
}

function EndOne({ session, act }: { session: SessionView; act: Act }) {
  const { state, pending, run } = useAct(act);
  return (
    <>
      <Button kind="plain" disabled={pending} onClick={() => run({ id: session.id })}>
        End<span className="vh"> the session on {session.device}</span>
      </Button>
      {state.status === "failed" && <span role="alert"> {state.message}</span>}
    </>
  );
}
