import { longDate } from "@/components/ui/dates";
import type { Job } from "@/lib/notify/job";
import type { Question } from "./questions/model";

export const notRecorded = "Not recorded";
export const notKnownWord = "Not known";

const isUnknown = (value: unknown) => value === "unknown" || value === "unreadable";

type Window = { days: string[]; from: string; to: string };
const dayWords: Record<string, string> = {
  mon: "Mon",
  tue: "Tue",
  wed: "Wed",
  thu: "Thu",
  fri: "Fri",
  sat: "Sat",
  sun: "Sun",
};

/** "daily", "weekdays", "Mon, Wed" */
export function daysInWords(days: readonly string[]): string {
  if (days.length === 7) return "daily";
  if (days.length === 5 && !days.includes("sat") && !days.includes("sun")) return "weekdays";
  if (days.length === 2 && days.includes("sat") && days.includes("sun")) return "weekends";
  return days.map((day) => dayWords[day] ?? day).join(", ");
}

const windowsInWords = (windows: Window[]) =>
  windows.map(({ days, from, to }) => `${from} to ${to}, ${daysInWords(days)}`).join("; ");

/** One answer in words, its unit with it; "Not recorded" and "Not known" are told apart. */
export function answerText(question: Question, value: unknown): string {
  if (value === null || value === undefined || value === "")
    return question.kind === "windows" && question.absent === "As the default" ? question.absent : notRecorded;
  if (isUnknown(value) && !(question.kind === "choice" && question.options.some((option) => option.value === value)))
    return notKnownWord;
  switch (question.kind) {
    case "choice":
      return question.options.find((option) => option.value === value)?.word ?? String(value);
    case "number":
      return question.unit === "no." ? String(value) : `${String(value)} ${question.unit}`;
    case "date":
      return longDate(String(value));
    case "lines":
      return (value as string[]).join(", ");
    case "several": {
      const words = (value as string[]).map(
        (one) => question.options.find((option) => option.value === one)?.word ?? one,
      );
      return words.length ? words.join(", ") : "None";
    }
    case "figures":
      return `${(value as number[]).join(", ")} ${question.unit}`;
    case "windows":
      return (value as Window[]).length ? windowsInWords(value as Window[]) : question.none;
    case "rows": {
      const count = (value as unknown[]).length;
      return count ? (value as Record<string, unknown>[]).map((row) => rowInWords(question, row)).join("; ") : "None";
    }
    case "triples":
      return (value as number[][]).map((state) => `${state.join(", ")} A`).join("; ");
    case "half-hours": {
      const readings = value as { kwh: number }[];
      return `${readings.length} half hours, highest ${Math.max(...readings.map(({ kwh }) => kwh))} kWh`;
    }
    case "text":
      return String(value);
  }
}

function rowInWords(question: Extract<Question, { kind: "rows" }>, row: Record<string, unknown>): string {
  const said = question.cells.slice(0, 3).flatMap(({ key, options, unit }) => {
    const value = row[key];
    if (value === null || value === undefined) return [];
    if (isUnknown(value)) return ["not known"];
    const word = options?.find((option) => option.value === value)?.word ?? String(value);
    return [unit ? `${word} ${unit}` : word];
  });
  return said.join(" ") || question.noun;
}

/** Whether an answer is an identifier or a measured value, which stand in the mono face. */
export const isMono = (question: Question, value: unknown): boolean =>
  value !== null &&
  !isUnknown(value) &&
  (question.kind === "number" || question.kind === "figures" || (question.kind === "text" && question.mono === true));

export type AnswerStanding = "answered" | "not-known" | "not-yet";

/** How one fact stands, without judging it. */
export function standingOf(value: unknown): AnswerStanding {
  if (value === null || value === undefined || value === "") return "not-yet";
  if (isUnknown(value) || (Array.isArray(value) && value.length === 1 && value[0] === "unknown")) return "not-known";
  return "answered";
}

/** "4 Ropewalk Lane, Oxcombe", or what stands in for it. */
export const siteOf = (job: Job) => job.site.address?.filter(Boolean).join(", ") || "No address yet";

/** "Kestrel Dock 7", or "2 chargepoints". */
export function unitOf(job: Job): string {
  const [first, ...others] = job.chargepoints;
  if (!first) return "No chargepoint yet";
  if (others.length) return `${others.length + 1} chargepoints`;
  return [first.make, first.model].filter(Boolean).join(" ") || "Chargepoint not named";
}

/** A supply number of 13 figures as it is read aloud, 2 4 4 3; any other as it was typed. */
export function spacedSupplyNumber(typed: string): string {
  const figures = /^(\d{2})(\d{4})(\d{4})(\d{3})$/.exec(typed.replace(/\s/g, ""));
  return figures ? figures.slice(1).join(" ") : typed;
}
