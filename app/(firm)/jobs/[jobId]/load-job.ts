import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { cache } from "react";
import { z } from "zod";
import { today } from "@/db/clock";
import { assessJob } from "@/db/queries/assessments";
import { getJob } from "@/db/queries/jobs";
import { valueOf } from "@/app/(firm)/value-of";
import { summaryOf } from "@/lib/notify/headline";
import type { FieldError, Result } from "@/lib/notify/result";
import type { AssessmentSummary, AssessmentView, JobView } from "@/lib/notify/views";
import { requireViewer, type Viewer } from "@/lib/server/auth/viewer";

export type LoadedJob = {
  viewer: Viewer;
  job: JobView;
  /** Null when the facts contradict each other; `wrong` then names them. */
  assessment: AssessmentView | null;
  summary: AssessmentSummary;
  today: string;
};

const contradicted = (fields: readonly FieldError[]): AssessmentSummary => ({
  route: null,
  headline: "The record contradicts itself",
  missing: [],
  lastDay: null,
  daysLeft: null,
  fields: [...fields],
});

function readAssessment(result: Result<AssessmentView>, on: string): Pick<LoadedJob, "assessment" | "summary"> {
  if (!result.ok && result.error.code === "contradictory")
    return { assessment: null, summary: contradicted(result.error.fields ?? []) };
  const view = valueOf(result);
  return { assessment: view, summary: summaryOf(view.body, on) };
}

/** Once a request, whoever asks: the page, and the title of its tab. */
const loadOnce = cache(async (jobId: string): Promise<LoadedJob> => {
  const viewer = await requireViewer();
  if (!z.uuid().safeParse(jobId).success) notFound();
  const assessed = await assessJob(viewer, { jobId });
  const job = valueOf(await getJob(viewer, { jobId }));
  const on = today();
  return { viewer, job, today: on, ...readAssessment(assessed, on) };
});

/** The job of an address with its assessment of today, for any page of a job. A miss is the not-found page. */
export const loadJob = async (params: Promise<{ jobId: string }>): Promise<LoadedJob> => loadOnce((await params).jobId);

/** A tab's title with the job's number in it, so that two open jobs are told apart: "Pack, FEN-0152". */
export async function jobTitle(name: string, params: Promise<{ jobId: string }>): Promise<Metadata> {
  const { job } = await loadJob(params);
  return { title: `${name}, ${job.number}` };
}
