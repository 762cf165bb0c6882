import Link from "next/link";
import { shortDate } from "@/components/ui/dates";
import { withQuery } from "@/components/ui/query-link";
import { ownFigureNames } from "@/lib/notify/firm-rules";
import { isLooser } from "@/lib/notify/register-figures";
import type { OperatorRow } from "@/lib/notify/views";
import { divisionWord, kindWord } from "./operator-words";

/** The register of operators with what this firm has set. */
export function OperatorTable({ rows, today }: { rows: OperatorRow[]; today: string }) {
  return (
    <table className="desk desk--operators">
      <caption className="vh">Network operators</caption>
      <thead>
        <tr>
          <th>Id</th>
          <th>Operator</th>
          <th>Area</th>
          <th>Kind</th>
          <th>Holidays of</th>
          <th>Listed</th>
          <th>Notices go to</th>
          <th>Own rule</th>
          <th className="num">Papers</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id}>
            <td className="mono">{row.id === "ni" ? "NI" : row.id}</td>
            <td className="desk__site" title={row.name}>
              <Link href={withQuery(`/operators/${row.id}`)}>{row.name}</Link>
            </td>
            <td title={row.area}>{row.area}</td>
            <td>{kindWord[row.kind]}</td>
            <td>{row.division ? (divisionWord[row.division] ?? row.division) : "the site’s part"}</td>
            <td className="quiet">{shortDate(row.from, today)}</td>
            <td title={row.settings.noticeEmail ?? row.noticeMailbox ?? undefined}>
              {row.settings.noticeEmail ?? <span className="quiet">{row.noticeMailbox ?? "not set"}</span>}
            </td>
            <td title={ownRule(row) || undefined}>
              {loosens(row, today) && <span className="strong">Looser: </span>}
              {ownRule(row)}
            </td>
            <td className="num">
              {row.openPapers > 0 && (
                <Link href={withQuery("/submissions", { operator: row.id })}>{row.openPapers}</Link>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function ownRule({ settings }: OperatorRow) {
  const { noticeDays: days, asksFirstAboveA, assumesFuseA, buriedSeparationM: metres } = settings;
  const said = [
    days === null ? null : days === 0 ? "notice by the day" : `notice in ${days} days`,
    asksFirstAboveA === null ? null : `asked above ${asksFirstAboveA} A`,
    assumesFuseA === null ? null : `refits ${assumesFuseA} A`,
    metres === null ? null : `${metres} m between electrodes`,
  ].filter(Boolean);
  return said.join("; ");
}

/** Figures that ask for less than the register, which the covers print. */
const loosens = ({ id, settings }: OperatorRow, today: string) =>
  ownFigureNames.some((name) => {
    const value = settings[name];
    return value !== null && isLooser(name, value, id, today);
  });
