import { longDate } from "@/components/ui/dates";
import { SourceLine } from "@/components/ui/source-line";
import { operatorEntry } from "@/lib/notify/operator-register";
import type { OperatorRow } from "@/lib/notify/views";
import { divisionWord } from "./operator-words";

/** What the register holds of an operator, with its days and its source. */
export function RegisterFacts({ row }: { row: OperatorRow }) {
  const names = operatorEntry(row.id)?.names ?? [];
  return (
    <>
      <div>
        <dt>Group</dt>
        <dd>{row.group}</dd>
      </div>
      <div>
        <dt>Holidays of</dt>
        <dd>{row.division ? (divisionWord[row.division] ?? row.division) : "the part the site is in"}</dd>
      </div>
      <div>
        <dt>Names</dt>
        <dd>
          {names.map(({ value, from, to }) => (
            <span className="facts__line" key={from}>
              {value}, from {longDate(from)}
              {to && ` to ${longDate(to)}`}
            </span>
          ))}
        </dd>
      </div>
      <div>
        <dt>Source</dt>
        <dd>
          <SourceLine reference={row.source} />
        </dd>
      </div>
    </>
  );
}
