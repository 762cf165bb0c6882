import { Mark } from "@/components/ui/mark";
import { SourceLine } from "@/components/ui/source-line";
import { citedOn } from "@/lib/calc/parameters/wiring-edition";
import type { Outcome } from "@/lib/notify/result";

export type ListedRule = {
  id: string;
  title: string;
  reads: readonly string[];
  sources: readonly string[];
  outcomes: readonly Outcome[];
};

type Props = {
  id: string;
  name: string;
  rules: readonly ListedRule[];
  /** The day whose edition of the wiring standard is cited. */ on: string;
};

/** One family of rules: what each checks, what it reads, what it may answer, and on whose word. */
export function RuleTable({ id, name, rules, on }: Props) {
  return (
    <section className="section" aria-labelledby={id} id={`family-${id}`}>
      <div className="section__head">
        <h2 id={id}>{name}</h2>
        <span className="quiet">{rules.length} rules</span>
      </div>
      <table className="ledger ledger--rules">
        <thead>
          <tr>
            <th>Rule</th>
            <th>May answer</th>
            <th>Reads</th>
            <th>Source</th>
          </tr>
        </thead>
        <tbody>
          {rules.map((rule) => (
            <tr key={rule.id} id={rule.id}>
              <td>
                <b className="strong">{rule.title}</b>
                <span className="facts__line mono quiet">{rule.id}</span>
              </td>
              <td>
                {rule.outcomes.map((outcome) => (
                  <Mark key={outcome} outcome={outcome} />
                ))}
              </td>
              <td className="mono">
                {rule.reads.map((path) => (
                  <span className="facts__line" key={path}>
                    {path}
                  </span>
                ))}
              </td>
              <td>
                {rule.sources.map((reference) => (
                  <span className="facts__line" key={reference}>
                    <SourceLine reference={citedOn(reference, on)} />
                  </span>
                ))}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
