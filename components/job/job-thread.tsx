import { Thread } from "@/components/thread/thread";
import type { Job } from "@/lib/notify/job";
import type { Eyelet, JobView } from "@/lib/notify/views";
import { subjects } from "./questions/model";
import { standingOfSubject } from "./stops";

type Props = { job: JobView; record?: Job; current: Eyelet };

/** The thread of a job, its first eyelet told as the list of subjects tells it: answers given of those asked. */
export function JobThread({ job, record = job.record, current }: Props) {
  const thread = job.thread.map((eyelet) =>
    eyelet.name === "job" && eyelet.standing !== "stopped" ? { ...eyelet, state: answersInWords(record) } : eyelet,
  );
  return <Thread jobId={job.id} thread={thread} current={current} />;
}

/** "112 of 126 answered", and whether the work is still to come. */
export function answersInWords(record: Job): string {
  const all = subjects.map((subject) => standingOfSubject(subject, record, []));
  const sum = (key: "answered" | "asked") => all.reduce((total, standing) => total + standing[key], 0);
  return `${sum("answered")} of ${sum("asked")} answered${record.stage === "planned" ? ", planned" : ""}`;
}
