import type { Metadata, Route } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { counted } from "@/components/ui/counted";
import { longMoment } from "@/components/ui/dates";
import { PutDown } from "@/components/team/put-down";
import { Mark } from "@/components/ui/mark";
import { Pager } from "@/components/ui/pager";
import { idOf, oneOf, withQuery } from "@/components/ui/query-link";
import { listEvents, verifyChain, type ChainCheck } from "@/db/queries/events";
import { listPutDown } from "@/db/queries/put-down";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";

export const metadata: Metadata = { title: "Activity" };

export default async function ActivityPage({ searchParams }: PageProps<"/activity">) {
  const viewer = await requireViewer();
  const asked = await searchParams;
  const jobId = idOf(asked.job);
  const after = oneOf(asked.after);
  const seen = after ? Number(oneOf(asked.seen) ?? 0) || 0 : 0;
  const [listed, chain, dead] = await Promise.all([
    listEvents(viewer, { after, jobId }),
    verifyChain(viewer),
    listPutDown(viewer),
  ]);
  const { rows, next } = valueOf(listed);
  const works = after || jobId ? [] : valueOf(dead);
  const jobNumber = jobId ? rows.find((row) => row.jobId === jobId)?.jobNumber : null;
  return (
    <main id="main" className="deskmain">
      <PageHead
        title="Activity"
        say={jobId ? `Of job ${jobNumber ?? "chosen"} only.` : "Every act of the firm, newest first."}
      >
        {jobId && (
          <Link className="btn" href={"/activity" as Route}>
            All jobs
          </Link>
        )}
      </PageHead>
      <div className="sheet">
        <ChainLine chain={valueOf(chain)} />
        {works.length > 0 && <PutDown works={works} />}
        <table className="desk desk--activity">
          <caption className="vh">Events</caption>
          <thead>
            <tr>
              <th>When</th>
              <th>Who</th>
              <th>Job</th>
              <th>What</th>
              <th>Hash</th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.id}>
                <td className="nowrap">
                  <time dateTime={row.at}>{longMoment(row.at)}</time>
                </td>
                <td>{row.actor}</td>
                <td className="mono">
                  {row.jobId && row.jobNumber && (
                    <Link href={withQuery("/activity", { job: row.jobId })}>{row.jobNumber}</Link>
                  )}
                </td>
                <td className="desk__site" title={row.sentence}>
                  {row.sentence}
                </td>
                <td className="mono quiet">{row.hash8}</td>
              </tr>
            ))}
          </tbody>
        </table>
        {rows.length === 0 && <p className="none">Nothing is recorded yet.</p>}
        <Pager path="/activity" query={{ job: jobId }} seen={seen} shown={rows.length} next={next} />
      </div>
    </main>
  );
}

/** Whether each event still carries the hash of the one before it. */
function ChainLine({ chain }: { chain: ChainCheck }) {
  const head = chain.head && (
    <>
      {" "}
      Head <span className="mono">{chain.head.slice(0, 8)}</span>, printed in every sealed manifest.
    </>
  );
  return (
    <p className="chain">
      <Mark outcome={chain.intact ? "met" : "not-met"}>{chain.intact ? "Chain whole" : "Chain broken"}</Mark>
      <span>
        {chain.firstBad
          ? `Event ${chain.firstBad.number}, ${longMoment(chain.firstBad.at)}, does not follow from the one before it.`
          : `${counted(chain.count, "event")}, each worked out again from the one before it.`}
        {head}
      </span>
    </p>
  );
}
