import type { Route } from "next";
import Link from "next/link";
import { addressOf, labelOf } from "@/components/job/questions/screens";
import { OutcomeGlyph } from "@/components/ui/mark";
import type { Job } from "@/lib/notify/job";
import type { FieldError } from "@/lib/notify/result";

/** Facts that cannot all be true: no rule runs until one of them is changed. */
export function Contradicted({ fields, record, jobId }: { fields: readonly FieldError[]; record: Job; jobId: string }) {
  return (
    <div className="split">
      <section className="decision" aria-labelledby="decision">
        <h2 id="decision">The facts contradict each other</h2>
        <p className="decision__also">Nothing is assessed until they are put right.</p>
        <ul className="missing">
          {fields.map(({ path, message }) => (
            <li key={path}>
              <span className="mark--not-met">
                <OutcomeGlyph outcome="not-met" />
              </span>
              <span>
                <b className="strong">{labelOf(path, record)}</b>: {message}
              </span>
              <Link href={addressOf(path, record, jobId) as Route}>
                Change<span className="vh">: {labelOf(path, record)}</span>
              </Link>
            </li>
          ))}
        </ul>
      </section>
    </div>
  );
}
