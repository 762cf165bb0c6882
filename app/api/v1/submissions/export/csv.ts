import { submissionChannelName, submissionPurposeName, submissionStateName } from "@/lib/notify/submission";
import type { SubmissionRow } from "@/lib/notify/views";

const columns: { heading: string; of: (row: SubmissionRow) => string | number | null }[] = [
  { heading: "Job", of: (row) => row.jobNumber },
  { heading: "Site", of: (row) => row.site },
  { heading: "Operator", of: (row) => row.operatorName },
  { heading: "Paper", of: (row) => submissionPurposeName[row.purpose] },
  { heading: "State", of: (row) => submissionStateName[row.state] },
  { heading: "Channel", of: (row) => (row.channel ? submissionChannelName[row.channel] : null) },
  { heading: "Sent", of: (row) => row.sentOn },
  { heading: "Working days", of: (row) => row.workingDaysSinceSent },
  { heading: "Due", of: (row) => row.dueOn },
  { heading: "Days left", of: (row) => row.daysLeft },
  { heading: "Next step", of: (row) => row.nextStep },
  { heading: "Reference", of: (row) => row.reference },
  { heading: "Pack version", of: (row) => row.packVersion },
];

/**
 * One cell. Text that a spreadsheet would run as a formula gets an apostrophe before it; numbers are ours and
 * stand as they are, a minus sign included.
 */
export function csvCell(value: string | number | null): string {
  if (value === null) return "";
  if (typeof value === "number") return String(value);
  const harmless = /^[=+\-@\t\r\n\p{Cc}]/u.test(value) ? `'${value}` : value;
  // Where a list is parted by semicolons or tabs, a cell must not break into two, the second of them a formula.
  return /[",;\t\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless;
}

/** The desk's rows as CSV with a byte order mark, so that spreadsheets read it as UTF-8. */
export const submissionCsv = (rows: readonly SubmissionRow[]): string =>
  `\uFEFF${[columns.map(({ heading }) => heading), ...rows.map((row) => columns.map(({ of }) => csvCell(of(row))))]
    .map((cells) => cells.join(","))
    .join("\r\n")}\r\n`;
