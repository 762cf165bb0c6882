import type { Route } from "next";
import Link from "next/link";
import { daysBetween, leftInWords, shortDate } from "@/components/ui/dates";
import { SortIcon } from "@/components/ui/icons";
import { withQuery, type Query } from "@/components/ui/query-link";
import type { JobFilter, JobRow } from "@/lib/notify/views";
import { routeWord, standingWord } from "./route-words";

type Props = { rows: JobRow[]; today: string; sort: JobFilter["sort"]; query: Query };

/** The firm's jobs, one a row. A heading that sorts is a link: the order stands in the address. */
export function JobTable({ rows, today, sort, query }: Props) {
  return (
    <table className="desk desk--jobs">
      <caption className="vh">Jobs</caption>
      <thead>
        <tr>
          <SortHead by="number" direction="descending" name="Job" sort={sort} query={query} />
          <th>Site</th>
          <th>Unit</th>
          <th>Operator</th>
          <th>Route</th>
          <th>Standing</th>
          <th>Installer</th>
          <th>Work</th>
          <SortHead by="last-day" direction="ascending" name="Last day" sort={sort} query={query} />
          <th className="num">Missing</th>
          <SortHead by="updated" direction="descending" name="Changed" sort={sort} query={query} />
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <JobLine key={row.id} row={row} today={today} />
        ))}
      </tbody>
    </table>
  );
}

type SortHeadProps = {
  by: JobFilter["sort"];
  direction: "ascending" | "descending";
  name: string;
  sort: JobFilter["sort"];
  query: Query;
};

const SortHead = ({ by, direction, name, sort, query }: SortHeadProps) => (
  <th aria-sort={sort === by ? direction : undefined}>
    <Link href={withQuery("/jobs", query, { sort: by === "last-day" ? null : by })}>
      {name} {sort === by && <SortIcon className={direction === "descending" ? "is-turned" : undefined} />}
    </Link>
  </th>
);

const isOpen = ({ standing }: JobRow) =>
  standing === "recording" || standing === "ready-to-seal" || standing === "returned" || standing === "sealed";

function JobLine({ row, today }: { row: JobRow; today: string }) {
  const left = row.lastDay && isOpen(row) ? daysBetween(today, row.lastDay) : null;
  const urgency = left === null ? undefined : left < 0 ? "is-late" : left <= 3 ? "is-near" : undefined;
  const workDay = row.installedOn ?? row.plannedOn;
  return (
    <tr>
      <td className="mono">
        <Link href={`/jobs/${row.id}` as Route}>{row.number}</Link>
      </td>
      <td className="desk__site" title={row.site}>
        {row.site}
      </td>
      <td title={row.unit}>{row.unit}</td>
      <td title={row.operatorName}>{row.operatorName}</td>
      <td>{routeWord[row.route]}</td>
      <td className={row.standing === "stopped" || row.standing === "returned" ? "is-near" : undefined}>
        {standingWord[row.standing]}
      </td>
      <td>{row.installerName}</td>
      <td>
        {workDay && (
          <>
            {row.stage === "planned" && <span className="quiet">plan </span>}
            {shortDate(workDay, today)}
          </>
        )}
      </td>
      <td className={urgency}>
        {row.lastDay && shortDate(row.lastDay, today)}
        {left !== null && `, ${leftInWords(left)}`}
      </td>
      <td className="num">{row.missingCount > 0 && row.missingCount}</td>
      <td className="quiet">{shortDate(row.updatedAt.slice(0, 10), today)}</td>
    </tr>
  );
}
