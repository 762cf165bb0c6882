import type { Route } from "next";
import Link from "next/link";
import { routeWord, standingWord } from "@/components/job-list/route-words";
import { counted } from "@/components/ui/counted";
import { daysBetween, daysLeftInWords, shortDate, shortMoment } from "@/components/ui/dates";
import { FlatSeal } from "@/components/ui/seal";
import { Stitch, Stretch } from "@/components/ui/stitch";
import type { JobRow, TodayView } from "@/lib/notify/views";
import { dayOfWork, isThrough, jobInHand, type DayGroups } from "./day-groups";

type Returned = NonNullable<TodayView["installer"]>["returned"];
type Props = { groups: DayGroups; returned: Returned; today: string };

/** The installer's day on the thread, what was sent back, what is unfinished and what is to come. */
export function InstallerDay({ groups, returned, today }: Props) {
  const inHand = jobInHand(groups);
  const rows = (jobs: JobRow[]) => (
    <ul className="day">
      {jobs.map((job) => (
        <li key={job.id}>
          <DayJob job={job} today={today} place={isThrough(job) ? "through" : job === inHand ? "in-hand" : "ahead"} />
        </li>
      ))}
    </ul>
  );
  return (
    <>
      {groups.today.length > 0 && rows(groups.today)}
      {returned.length > 0 && (
        <Pile name="Sent back to you" count={returned.length}>
          <ul className="day">
            {returned.map((back) => (
              <li key={`${back.jobId} ${back.at}`}>
                <Link className="day-row day-row--first" href={`/jobs/${back.jobId}/review` as Route}>
                  <b>{back.site}</b>
                  <span className="day-row__when">{back.jobNumber}</span>
                  <span className="day-row__need">{back.reason}</span>
                  <span className="day-row__need">
                    {back.by}, {shortMoment(back.at)}
                  </span>
                </Link>
              </li>
            ))}
          </ul>
        </Pile>
      )}
      {groups.unfinished.length > 0 && (
        <Pile name="Not finished" count={groups.unfinished.length}>
          {rows(groups.unfinished)}
        </Pile>
      )}
      {groups.coming.length > 0 && (
        <Pile name="To come" count={groups.coming.length}>
          {rows(groups.coming)}
        </Pile>
      )}
    </>
  );
}

function Pile({ name, count, children }: { name: string; count: number; children: React.ReactNode }) {
  return (
    <section aria-label={name}>
      <h2 className="route-line">
        <span>{name}</span>
        <span>{count}</span>
      </h2>
      {children}
    </section>
  );
}

const wireOf = { through: "whole", "in-hand": "to-here", ahead: "ahead" } as const;
const stitchOf = { through: "answered", "in-hand": "in-hand", ahead: "not-yet" } as const;

function DayJob({ job, today, place }: { job: JobRow; today: string; place: keyof typeof wireOf }) {
  const on = dayOfWork(job);
  const left = job.lastDay ? daysBetween(today, job.lastDay) : null;
  return (
    <Link className="day-row" href={`/jobs/${job.id}` as Route}>
      <Stretch wire={wireOf[place]} />
      <Stitch state={job.standing === "stopped" ? "stopped" : stitchOf[place]} />
      <b>{job.site}</b>
      <span className="day-row__when">{on ? (on === today ? "today" : shortDate(on, today)) : "no date"}</span>
      {place === "through" ? (
        <span className="day-row__need day-row__sealed">
          <FlatSeal />
          {standingWord[job.standing]}
        </span>
      ) : (
        <>
          <span className="day-row__need">
            {job.stage === "planned" ? "Survey, " : ""}
            {job.unit}, {routeWord[job.route].toLowerCase()}
          </span>
          {job.missingCount > 0 && (
            <span className="day-row__need day-row__left">{counted(job.missingCount, "fact")} missing</span>
          )}
          {job.lastDay && left !== null && (
            <span className={left < 0 ? "day-row__need is-late" : "day-row__need"}>
              {daysLeftInWords(left)}, {shortDate(job.lastDay, today)}
            </span>
          )}
        </>
      )}
    </Link>
  );
}
