import type { ReactNode } from "react";
import type { Eyelet, JobView } from "@/lib/notify/views";
import { JobBar } from "./job-bar";
import { JobHead } from "./job-head";
import { JobThread } from "./job-thread";

type Props = {
  job: JobView;
  current: Eyelet;
  /** The acts at the right of the head; on a phone they follow the head. */
  acts?: ReactNode;
  /** The overview has the firm's bar with its menu; the pages below it have a way back. */
  isOverview?: boolean;
  children: ReactNode;
};

/** The page of one eyelet: head, thread, and a sheet below. */
export function JobPage({ job, current, acts, isOverview, children }: Props) {
  return (
    <main id="main" className={isOverview ? "job-page job-page--overview" : "job-page"}>
      {!isOverview && <JobBar number={job.number} back={`/jobs/${job.id}`} backTo="the job" />}
      <JobHead number={job.number} record={job.record}>
        {acts}
      </JobHead>
      <div className="sheet">
        <JobThread job={job} current={current} />
        {children}
      </div>
    </main>
  );
}
