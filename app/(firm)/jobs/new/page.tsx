import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { z } from "zod";
import { copyAct } from "@/app/(firm)/jobs/[jobId]/actions";
import { PageHead } from "@/components/frame/page-head";
import { NewJob } from "@/components/job/new-job";
import { oneOf } from "@/components/ui/query-link";
import { today } from "@/db/clock";
import { getJob, listJobs } from "@/db/queries/jobs";
import { may } from "@/lib/notify/permissions";
import { siteOf, unitOf } from "@/components/job/answer-text";
import { requireViewer, type Viewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../../value-of";

export const metadata: Metadata = { title: "New job" };

const newestFirst = {
  q: null,
  stage: null,
  standing: null,
  operatorId: null,
  route: null,
  installerId: null,
  sort: "updated",
  after: null,
} as const;

const inWords = (number: string, site: string, unit: string) => `${number}, ${site}, ${unit}`;

/** The jobs a new one can be copied from: the one asked for, then the newest. */
async function earlierJobs(viewer: Viewer, copyOf: string | null) {
  const newest = valueOf(await listJobs(viewer, newestFirst)).rows.map(({ id, number, site, unit }) => ({
    id,
    words: inWords(number, site, unit),
  }));
  if (!copyOf || newest.some(({ id }) => id === copyOf) || !z.uuid().safeParse(copyOf).success) return newest;
  const { id, number, record } = valueOf(await getJob(viewer, { jobId: copyOf }));
  return [{ id, words: inWords(number, siteOf(record), unitOf(record)) }, ...newest];
}

/** Opens a job: blank, or a copy of an earlier one for another site. */
export default async function NewJobPage({ searchParams }: PageProps<"/jobs/new">) {
  const viewer = await requireViewer();
  if (!may(viewer.roles, "jobs.write")) notFound();
  const copyOf = oneOf((await searchParams).copy);
  return (
    <main id="main">
      <PageHead title="New job" say="What is known already. Everything can be added and changed later." />
      <div className="sheet">
        <NewJob today={today()} copyOf={copyOf} earlier={await earlierJobs(viewer, copyOf)} copy={copyAct} />
      </div>
    </main>
  );
}
