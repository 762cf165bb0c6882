import type { Metadata, Route } from "next";
import Link from "next/link";
import { dayGroups, jobInHand } from "@/components/today/day-groups";
import { InstallerDay } from "@/components/today/installer-day";
import { KeptHere } from "@/components/today/kept-here";
import { WaitingPapers } from "@/components/today/waiting-papers";
import { WaitingReviews } from "@/components/today/waiting-reviews";
import { ButtonLink } from "@/components/ui/button";
import { counted } from "@/components/ui/counted";
import { daysBetween, daysLeftInWords, shortDate, weekdayDate } from "@/components/ui/dates";
import { Stretch } from "@/components/ui/stitch";
import { today as todayOf } from "@/db/queries/today";
import { today } from "@/db/clock";
import { may } from "@/lib/notify/permissions";
import type { TodayView } from "@/lib/notify/views";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "./value-of";

export const metadata: Metadata = { title: "Today" };

export default async function TodayPage() {
  const viewer = await requireViewer();
  const view = valueOf(await todayOf(viewer));
  const on = today();
  const groups = view.installer && dayGroups(view.installer.jobs, on);
  const inHand = groups && jobInHand(groups);
  return (
    <main id="main" className="today">
      <div className="site__body">
        <header className="step today__head">
          {view.installer && <Stretch wire="whole" />}
          <div>
            <h1>Today</h1>
            <p>
              {weekdayDate(on)}
              {groups && `, ${counted(groups.today.length, "job")} today`}
            </p>
          </div>
          {may(viewer.roles, "jobs.write") && (
            <ButtonLink className="only-desk" kind={inHand ? "outline" : "act"} href={"/jobs/new" as Route}>
              New job
            </ButtonLink>
          )}
        </header>
        <div className="today__piles">
          <KeptHere userId={viewer.userId} />
          {view.installer && groups && <InstallerDay groups={groups} returned={view.installer.returned} today={on} />}
          {view.admin && <WaitingPapers admin={view.admin} today={on} />}
          {view.compliance && view.compliance.waiting.length > 0 && (
            <WaitingReviews waiting={view.compliance.waiting} />
          )}
          {isClear(view) && <p className="today__clear">Nothing waits for you today.</p>}
        </div>
      </div>
      {may(viewer.roles, "jobs.write") && view.installer && (
        <footer className="site__foot today__foot">
          <div className="site__facts">
            <Link href={"/jobs" as Route}>All jobs</Link>
            {inHand?.lastDay && (
              <span>
                <b className="strong">{daysLeftInWords(daysBetween(on, inHand.lastDay))}</b>,{" "}
                {shortDate(inHand.lastDay, on)}
              </span>
            )}
          </div>
          {inHand ? (
            <ButtonLink kind="act" site href={`/jobs/${inHand.id}` as Route}>
              Go on at {inHand.site.split(",")[0]}
            </ButtonLink>
          ) : (
            <ButtonLink kind="act" site href={"/jobs/new" as Route}>
              New job
            </ButtonLink>
          )}
        </footer>
      )}
    </main>
  );
}

const isClear = ({ installer, admin, compliance }: TodayView) =>
  !installer?.jobs.length &&
  !installer?.returned.length &&
  !admin?.late.length &&
  !admin?.unsent.length &&
  !admin?.unanswered.length &&
  !compliance?.waiting.length;
