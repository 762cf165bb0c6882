import type { Route } from "next";
import { Checks } from "@/components/assessment/checks";
import { checkGroups, reasonRows, tallyOf } from "@/components/assessment/check-rows";
import { AskedFor } from "@/components/assessment/asked-for";
import { Contradicted } from "@/components/assessment/contradicted";
import { DaysLeft } from "@/components/assessment/days-left";
import { Decision } from "@/components/assessment/decision";
import { DemandPicture } from "@/components/assessment/demand-picture";
import { Orders } from "@/components/assessment/orders";
import { Picture } from "@/components/assessment/picture";
import { ReasonTable } from "@/components/assessment/reason-table";
import { JobPage } from "@/components/job/job-page";
import { MissingList } from "@/components/job/missing-list";
import { ButtonLink } from "@/components/ui/button";
import { Caution } from "@/components/ui/caution";
import { Tally } from "@/components/ui/mark";
import { valueAt } from "@/lib/calc/parameter";
import type { Assessment } from "@/lib/notify/assessment";
import { notificationData } from "@/lib/notify/notification";
import { dwellingLimitA } from "@/lib/notify/parameters/network";
import { may } from "@/lib/notify/permissions";
import { ruleDay } from "@/lib/notify/rule-day";
import type { JobView } from "@/lib/notify/views";
import { touchVoltageFigure } from "@/templates/open-pen-figures";
import { jobTitle, loadJob } from "../load-job";

export const generateMetadata = ({ params }: PageProps<"/jobs/[jobId]/assessment">) => jobTitle("Assessment", params);

/** The second eyelet: the decision with its reasons, the checks with their workings, the days, what is missing. */
export default async function AssessmentPage({ params }: PageProps<"/jobs/[jobId]/assessment">) {
  const { viewer, job, assessment, summary, today } = await loadJob(params);
  const mayWrite = may(viewer.roles, "jobs.write");
  if (!assessment)
    return (
      <JobPage job={job} current="assessment" acts={<Acts jobId={job.id} mayWrite={mayWrite} route={null} />}>
        <Contradicted fields={summary.fields} record={job.record} jobId={job.id} />
      </JobPage>
    );
  const { body } = assessment;
  const isStop = body.route.demand === "stop";
  return (
    <JobPage
      job={job}
      current="assessment"
      acts={<Acts jobId={job.id} mayWrite={mayWrite} route={body.route.demand} />}
    >
      <div className="split split--decided">
        <div className="stack">
          {isStop ? <Stop job={job} body={body} mayWrite={mayWrite} /> : <Decision assessment={body} />}
          {!isStop && body.route.demand !== "notify" && <Asked job={job} body={body} mayWrite={mayWrite} />}
          <AllChecks body={body} />
          <section aria-labelledby="demand">
            <div className="section section__head">
              <h2 id="demand">Demand against the limits</h2>
            </div>
            <DemandPicture job={job.record} demand={body.demand} noticeLimitA={noticeLimit(job)} />
          </section>
          <TouchVoltage job={job} body={body} />
        </div>
        <div className="stack">
          {isStop ? (
            <EmergencyLine territory={job.record.site.territory} />
          ) : (
            <Days job={job} body={body} today={today} />
          )}
          <section className="decided__missing" aria-labelledby="missing">
            <div className="section section__head">
              <h2 id="missing">Missing</h2>
              <span>{body.missing.length}</span>
            </div>
            <MissingList missing={body.missing} record={job.record} jobId={job.id} />
          </section>
          {body.cautions.map((words) => (
            <Caution key={words} title={firstSentence(words)}>
              {words.slice(firstSentence(words).length).trim()}
            </Caution>
          ))}
        </div>
      </div>
    </JobPage>
  );
}

function Acts({
  jobId,
  mayWrite,
  route,
}: {
  jobId: string;
  mayWrite: boolean;
  route: Assessment["route"]["demand"] | null;
}) {
  return (
    <>
      {mayWrite && <ButtonLink href={`/jobs/${jobId}` as Route}>Change facts</ButtonLink>}
      {route && route !== "stop" && (
        <ButtonLink kind="act" href={`/jobs/${jobId}/pack` as Route}>
          {route === "apply" || route === "late-application" ? "Preview the application" : "Preview the pack"}
        </ButtonLink>
      )}
    </>
  );
}

const firstSentence = (words: string) => /^.*?\.(?= |$)/.exec(words)?.[0] ?? words;

/** Above it a dwelling asks first; other premises have no such figure. */
function noticeLimit({ record }: JobView): number | null {
  const { premises } = record.site;
  return premises === null || premises === "domestic" ? valueAt(dwellingLimitA, ruleDay(record.dates)) : null;
}

type Part = { job: JobView; body: Assessment; mayWrite: boolean };

function Stop({ job, body, mayWrite }: Part) {
  const dangers = body.route.reasons.filter(({ used }) => used.leadsTo === "stop");
  return (
    <>
      <Decision assessment={body}>
        <div className="section section__head">
          <h3>Now, in this order</h3>
        </div>
        <Orders
          job={job.record}
          jobId={job.id}
          operatorName={body.operator.name}
          danger={dangers.map(({ title }) => title.toLowerCase()).join(", ")}
          mayWrite={mayWrite}
        />
      </Decision>
      <section aria-labelledby="why">
        <div className="section section__head">
          <h2 id="why">What is recorded</h2>
        </div>
        <ReasonTable rows={reasonRows(body)} />
      </section>
    </>
  );
}

function Asked({ job, body, mayWrite }: Part) {
  const sections = notificationData(job.record, body);
  const rows = sections.flatMap((section) => section.rows);
  return (
    <section aria-labelledby="asked">
      <div className="section section__head">
        <h2 id="asked">What {body.operator.name} will ask</h2>
        <span>
          {rows.filter(({ value }) => value !== null).length} of {rows.length} recorded
        </span>
      </div>
      <AskedFor
        sections={sections}
        job={job.record}
        jobId={job.id}
        missing={body.missing.map(({ path }) => path)}
        mayWrite={mayWrite}
      />
    </section>
  );
}

function AllChecks({ body }: { body: Assessment }) {
  const groups = checkGroups(body);
  return (
    <section aria-labelledby="checks">
      <div className="section section__head">
        <h2 id="checks">Checks</h2>
        <Tally counts={tallyOf(groups.flatMap(({ rows }) => rows))} all />
      </div>
      <Checks groups={groups} />
    </section>
  );
}

function Days({ job, body, today }: { job: JobView; body: Assessment; today: string }) {
  const { installed, commissioned, completed } = job.record.dates;
  return body.deadlines.map((deadline) => (
    <DaysLeft
      key={deadline.what}
      deadline={deadline}
      from={deadline.what === "building-control" ? (completed ?? installed) : (installed ?? commissioned)}
      today={today}
    />
  ));
}

const EmergencyLine = ({ territory }: { territory: JobView["record"]["site"]["territory"] }) =>
  territory === "northern-ireland" || territory === null ? (
    <section className="days days--middle" aria-label="Emergency line">
      <p className="days__t">
        <b>the emergency number</b>
        {territory === null
          ? "Great Britain: 105. Northern Ireland has its own number, on the bill."
          : "Northern Ireland has its own number, on the bill."}
      </p>
    </section>
  ) : (
    <section className="days days--middle" aria-label="Emergency line">
      <span className="days__n">105</span>
      <p className="days__t">
        <b>the emergency line</b>
        Great Britain, any hour, free to call. Northern Ireland has its own number.
      </p>
    </section>
  );

function TouchVoltage({ job, body }: { job: JobView; body: Assessment }) {
  const drawn = body.openPen.flatMap((result) => {
    const drawing = touchVoltageFigure(job.record, body, result);
    return drawing ? [{ result, drawing }] : [];
  });
  return drawn.map(({ result, drawing }) => (
    <section key={result.chargepoint} aria-label={`Touch voltage, open PEN, ${result.chargepoint}`}>
      <div className="section section__head">
        <h2>Touch voltage, open PEN</h2>
      </div>
      <Picture drawing={drawing} caption={result.because} />
    </section>
  ));
}
