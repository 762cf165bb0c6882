import type { Metadata, Route } from "next";
import { PageHead } from "@/components/frame/page-head";
import { JobFilters } from "@/components/job-list/job-filters";
import { LiveJobs } from "@/components/job-list/live-jobs";
import { routeWord, stageWord, standingWord } from "@/components/job-list/route-words";
import { ButtonLink } from "@/components/ui/button";
import { counted } from "@/components/ui/counted";
import { Pager, rangeInWords } from "@/components/ui/pager";
import { idOf, oneOf, wordOf, type Query } from "@/components/ui/query-link";
import { today } from "@/db/clock";
import { listJobs } from "@/db/queries/jobs";
import type { DemandRoute } from "@/lib/notify/assessment";
import { may } from "@/lib/notify/permissions";
import type { JobFilter, JobRow, JobStanding } from "@/lib/notify/views";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";

export const metadata: Metadata = { title: "Jobs" };

const keys = <K extends string>(words: Record<K, string>) => Object.keys(words) as K[];

export default async function JobsPage({ searchParams }: PageProps<"/jobs">) {
  const viewer = await requireViewer();
  const asked = await searchParams;
  const filter: JobFilter = {
    q: oneOf(asked.q),
    stage: wordOf<JobRow["stage"]>(asked.stage, keys(stageWord)),
    standing: wordOf<JobStanding>(asked.standing, keys(standingWord)),
    operatorId: oneOf(asked.operator),
    route: wordOf<DemandRoute>(asked.route, keys(routeWord)),
    installerId: idOf(asked.installer),
    sort: wordOf(asked.sort, ["last-day", "updated", "number"] as const) ?? "last-day",
    after: oneOf(asked.after),
  };
  const seen = filter.after ? Number(oneOf(asked.seen) ?? 0) || 0 : 0;
  const filters: Query = {
    q: filter.q,
    stage: filter.stage,
    standing: filter.standing,
    operator: filter.operatorId,
    route: filter.route,
    installer: filter.installerId,
  };
  const query: Query = { ...filters, sort: filter.sort === "last-day" ? null : filter.sort };
  const page = valueOf(await listJobs(viewer, filter));
  const filtered = Object.values(filters).some(Boolean);
  return (
    <main id="main" className="deskmain">
      <PageHead title="Jobs" say={`${counted(page.total, "job")}${filtered ? " match" : ""}.`}>
        {may(viewer.roles, "jobs.write") && (
          <ButtonLink kind="act" href={"/jobs/new" as Route}>
            New job
          </ButtonLink>
        )}
      </PageHead>
      <div className="sheet">
        <JobFilters
          key={JSON.stringify(query)}
          filter={filter}
          count={rangeInWords(seen, page.rows.length, page.total)}
        />
        {page.rows.length > 0 ? (
          <LiveJobs first={page} today={today()} sort={filter.sort} query={query} after={filter.after} />
        ) : (
          <p className="none">{filtered ? "No job matches." : "No job is recorded yet."}</p>
        )}
        <Pager path="/jobs" query={query} seen={seen} shown={page.rows.length} next={page.next} />
      </div>
    </main>
  );
}
