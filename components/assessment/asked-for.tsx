import type { Route } from "next";
import Link from "next/link";
import { addressOf, placeOf } from "@/components/job/questions/screens";
import { Mark } from "@/components/ui/mark";
import type { Job } from "@/lib/notify/job";

export type AskedSection = {
  section: string;
  rows: readonly { key: string; label: string; value: string | null; unit: string | null }[];
};

type Props = {
  sections: readonly AskedSection[];
  job: Job;
  jobId: string;
  /** Paths that block this route; every other gap is only said. */
  missing: readonly string[];
  mayWrite: boolean;
};

/** What the operator will ask, in the order of its form, with what is recorded of it. */
export function AskedFor({ sections, job, jobId, missing, mayWrite }: Props) {
  return (
    <table className="ledger ledger--asked">
      <thead>
        <tr>
          <th>Asked for</th>
          <th className="col-answer">Recorded</th>
        </tr>
      </thead>
      {sections.map(({ section, rows }) => (
        <tbody key={section}>
          <tr className="group">
            <th colSpan={2} scope="rowgroup">
              <div>
                <h3>{section}</h3>
              </div>
            </th>
          </tr>
          {rows.map(({ key, label, value, unit }) => (
            <tr key={key}>
              <td>{label}</td>
              <td>
                {value === null ? (
                  <span className="asked-missing">
                    {missing.includes(key) ? (
                      <Mark outcome="cannot-tell">Missing</Mark>
                    ) : (
                      <span className="quiet">not recorded</span>
                    )}
                    {mayWrite && placeOf(key, job) && (
                      <Link href={addressOf(key, job, jobId) as Route}>
                        Add<span className="vh">: {label}</span>
                      </Link>
                    )}
                  </span>
                ) : (
                  <>
                    {value}
                    {unit ? ` ${unit}` : ""}
                  </>
                )}
              </td>
            </tr>
          ))}
        </tbody>
      ))}
    </table>
  );
}
