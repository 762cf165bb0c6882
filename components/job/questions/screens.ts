import type { Job } from "@/lib/notify/job";
import { board } from "./board";
import { chargepoint } from "./chargepoint";
import { circuit } from "./circuit";
import { demand } from "./demand";
import { earthing } from "./earthing";
import { intake } from "./intake";
import { type Group, type Question, type Repeats, type Subject, subjects } from "./model";
import { people } from "./people";
import { settings } from "./settings";
import { furtherSettings } from "./settings-further";

export const subjectName: Record<Subject, string> = {
  intake: "Intake",
  demand: "Demand",
  chargepoint: "Chargepoint",
  circuit: "Circuit",
  earthing: "Earthing",
  settings: "Settings",
  photos: "Photos",
  people: "People and dates",
};

/** Photos have a screen of their own, so no groups. */
export const groups: Record<Subject, readonly Group[]> = {
  intake,
  demand,
  chargepoint,
  circuit: [...circuit, ...board],
  earthing,
  settings: [...settings, ...furtherSettings],
  photos: [],
  people,
};

/** A question with its whole path in the record. */
export type AskedQuestion = Question & { at: string };

export type Screen = {
  subject: Subject;
  /** Stable name in the address: `cable-1`, or `intake`. */
  key: string;
  title: string;
  lead: string | null;
  /** The item asked about, and how many of its kind there are. */
  item: { list: Repeats; index: number; of: number } | null;
  more: boolean;
  /** 1 for the first screen of a group that needs several. */
  part: number;
  questions: AskedQuestion[];
};

/** Most inputs a phone screen may hold. */
const mostInputs = 7;

const keyOf = (title: string) =>
  title
    .toLowerCase()
    .replace(/[^a-z]+/g, "-")
    .replace(/^-|-$/g, "");

function screensOfGroup(group: Group, job: Job): Screen[] {
  const items = group.each ? job[group.each].length : 1;
  return Array.from({ length: items }, (_, index) => index).flatMap((index) => {
    const asked = group.questions
      .filter((question) => question.applies?.(job, index) ?? true)
      .map((question) => ({
        ...question,
        at: group.each ? `${group.each}[${index}].${question.path}` : question.path,
      }));
    const count = Math.ceil(asked.length / mostInputs);
    /* Even parts, so that no screen is left with a single question. */
    const size = Math.ceil(asked.length / count);
    const parts = Array.from({ length: count }, (_, part) => asked.slice(part * size, (part + 1) * size));
    return parts.map((questions, part) => ({
      subject: group.subject,
      key: [keyOf(group.title), ...(group.each ? [index + 1] : []), ...(part ? [`part-${part + 1}`] : [])].join("-"),
      title: group.title,
      lead: group.lead ?? null,
      item: group.each ? { list: group.each, index, of: items } : null,
      more: group.more?.(job, index) ?? false,
      part: part + 1,
      questions,
    }));
  });
}

/** The screens of one subject for this job, in order; those of the walk first, then the ones reached by a link. */
export function screensOf(subject: Subject, job: Job): Screen[] {
  const all = groups[subject].flatMap((group) => screensOfGroup(group, job));
  return [...all.filter(({ more }) => !more), ...all.filter(({ more }) => more)];
}

/** Every screen of the walk, without those reached by a link. */
export const walkOf = (job: Job): Screen[] =>
  subjects.flatMap((subject) => screensOf(subject, job)).filter(({ more }) => !more);

export const recordAddress = (jobId: string, subject: Subject, screenKey?: string, path?: string) => {
  if (subject === "photos") return `/jobs/${jobId}/photos`;
  const query = screenKey ? `?screen=${screenKey}` : "";
  return `/jobs/${jobId}/record/${subject}${query}${path ? `#${fieldId(path)}` : ""}`;
};

/** The id of the control that answers a path: letters, figures and hyphens only. */
export const fieldId = (path: string) => `f-${path.replace(/[^A-Za-z0-9]+/g, "-").replace(/-$/, "")}`;

/** Where in the walk a path of the record is asked; null when no screen asks it (the rules name photos as `evidence`). */
export function placeOf(path: string, job: Job): { subject: Subject; screen: Screen | null; at: string } | null {
  if (/^evidence\b/.test(path)) return { subject: "photos", screen: null, at: path };
  let near: { subject: Subject; screen: Screen; at: string; length: number } | null = null;
  for (const subject of subjects)
    for (const screen of screensOf(subject, job))
      for (const question of screen.questions) {
        const inside = path === question.at || path.startsWith(`${question.at}.`) || path.startsWith(`${question.at}[`);
        const above = question.at.startsWith(`${path}.`) || question.at.startsWith(`${path}[`);
        const length = inside ? 1000 + question.at.length : above ? 1 : 0;
        if (length > (near?.length ?? 0)) near = { subject, screen, at: question.at, length };
      }
  if (near) return near;
  const list = /^(chargepoints|circuits|boards)\b/.exec(path)?.[1];
  if (list === "chargepoints") return { subject: "chargepoint", screen: null, at: path };
  return list ? { subject: "circuit", screen: null, at: path } : null;
}

/** The address that answers a missing fact, ending at its field. */
export function addressOf(path: string, job: Job, jobId: string): string {
  const place = placeOf(path, job);
  if (!place) return `/jobs/${jobId}`;
  return recordAddress(jobId, place.subject, place.screen?.key, place.subject === "photos" ? undefined : place.at);
}

/** The words of a path, for lists of errors and conflicts: "Cable 2: Length". */
export function labelOf(path: string, job: Job): string {
  const place = placeOf(path, job);
  const question = place?.screen?.questions.find(({ at }) => at === place.at);
  if (!question) return path;
  const { item } = place?.screen ?? {};
  return item && item.of > 1 ? `${question.short ?? question.label}, ${item.index + 1} of ${item.of}` : question.label;
}
