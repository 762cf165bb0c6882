import type { Job } from "@/lib/notify/job";
import type { AssessmentSummary } from "@/lib/notify/views";
import { factAt } from "../drafts/facts-at";
import { standingOf } from "./answer-text";
import { type Subject, subjects } from "./questions/model";
import { placeOf, recordAddress, type Screen, screensOf, subjectName } from "./questions/screens";

/** One stop of the walk: a screen, a subject whose list is still empty, the photos, or the check at the end. */
export type Stop = { subject: Subject | "check"; screen: Screen | null; name: string };

/** Every stop in order, without the screens reached by a link. */
export function stopsOf(job: Job): Stop[] {
  const asked = subjects.flatMap((subject): Stop[] => {
    const screens = screensOf(subject, job).filter(({ more }) => !more);
    if (screens.length === 0) return [{ subject, screen: null, name: subjectName[subject] }];
    return screens.map((screen, index) => ({
      subject,
      screen,
      name: index === 0 ? subjectName[subject] : screenName(screen),
    }));
  });
  return [...asked, { subject: "check", screen: null, name: "Check answers" }];
}

/** "Cable", or "Cable 2" where there are several cables; a group on several screens adds its part. */
export const screenName = ({ title, item, part }: Screen) =>
  `${title}${item && item.of > 1 ? ` ${item.index + 1}` : ""}${part > 1 ? `, part ${part}` : ""}`;

/** The stop after a screen; from one reached by a link, the next subject. */
export function stopAfter(job: Job, subject: Subject, screenKey: string | null): Stop {
  const stops = stopsOf(job);
  const here = stops.findIndex((stop) => stop.subject === subject && (stop.screen?.key ?? null) === screenKey);
  const from = here >= 0 ? here : stops.findLastIndex((stop) => stop.subject === subject);
  return stops[from + 1] ?? { subject: "check", screen: null, name: "Check answers" };
}

export const addressOfStop = (jobId: string, { subject, screen }: Stop) =>
  subject === "check" ? `/jobs/${jobId}/check` : recordAddress(jobId, subject, screen?.key);

export type SubjectStanding = { answered: number; asked: number; notKnown: number; missing: number };

/** How far one subject is: its asked questions, those answered, and what the route still needs of it. */
export function standingOfSubject(subject: Subject, job: Job, missing: AssessmentSummary["missing"]): SubjectStanding {
  const asked = screensOf(subject, job)
    .filter(({ more }) => !more)
    .flatMap(({ questions }) => questions)
    .filter(({ optional }) => !optional);
  const standings = asked.map(({ at }) => standingOf(factAt(job, at)));
  return {
    asked: asked.length,
    answered: standings.filter((standing) => standing !== "not-yet").length,
    notKnown: standings.filter((standing) => standing === "not-known").length,
    missing: missing.filter(({ path }) => placeOf(path, job)?.subject === subject).length,
  };
}
