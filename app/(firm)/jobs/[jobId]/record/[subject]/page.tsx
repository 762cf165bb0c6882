import type { Metadata } from "next";
import { notFound, redirect } from "next/navigation";
import { subjects } from "@/components/job/questions/model";
import { subjectName } from "@/components/job/questions/screens";
import { Walk } from "@/components/job/walk";
import { may } from "@/lib/notify/permissions";
import { blankItems } from "../../blank-items";
import { jobTitle, loadJob } from "../../load-job";

const subjectNamed = (name: string) => subjects.find((subject) => subject === name && subject !== "photos");

export async function generateMetadata({ params }: PageProps<"/jobs/[jobId]/record/[subject]">): Promise<Metadata> {
  const subject = subjectNamed((await params).subject);
  return subject ? jobTitle(subjectName[subject], params) : { title: "Not found" };
}

/** One subject of the walk. Those who may read a job but not write it see its answers instead. */
export default async function RecordPage({ params }: PageProps<"/jobs/[jobId]/record/[subject]">) {
  const { viewer, job, summary, today } = await loadJob(params);
  if (!subjectNamed((await params).subject)) notFound();
  if (!may(viewer.roles, "jobs.write")) redirect(`/jobs/${job.id}/check`);
  return <Walk job={job} userId={viewer.userId} today={today} summary={summary} blanks={blankItems()} />;
}
