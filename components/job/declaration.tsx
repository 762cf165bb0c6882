import { TextArea } from "@/components/ui/field";
import { Stitch } from "@/components/ui/stitch";
import type { Job } from "@/lib/notify/job";

/** The words that are declared and kept in the sealed record. */
export const declarationWords =
  "I did or supervised this work, and what is recorded here is what I saw, tested and set. Where I could not tell, it says so. I left covers and seals on the operator’s equipment as I found them.";

type Props = {
  record: Job;
  /** Nothing blocks: this is the stitch in hand. */
  isNext: boolean;
  declared: boolean;
  setDeclared: (declared: boolean) => void;
  gaps: { open: boolean; setOpen: (open: boolean) => void; reason: string; setReason: (reason: string) => void } | null;
};

/** The declaration of the competent person, and the reason when it is sealed with gaps. */
export function Declaration({ record, isNext, declared, setDeclared, gaps }: Props) {
  const { name, registration } = record.competentPerson;
  return (
    <section className="declare" aria-labelledby="declaration">
      <svg className="stretch" aria-hidden="true">
        <line className={isNext ? undefined : "ahead"} x1="22" y1="0" x2="22" y2="12" />
      </svg>
      <Stitch state={isNext ? "in-hand" : "not-yet"} />
      <h2 id="declaration">Declaration</h2>
      <p className="declare__words">{declarationWords}</p>
      <label className="tick">
        <input
          className="check"
          type="checkbox"
          checked={declared}
          onChange={(event) => setDeclared(event.target.checked)}
        />
        <span>I declare this as the competent person</span>
      </label>
      {gaps && (
        <>
          <label className="tick tick--second">
            <input
              className="check"
              type="checkbox"
              checked={gaps.open}
              onChange={(event) => gaps.setOpen(event.target.checked)}
            />
            <span>Seal with gaps</span>
          </label>
          {gaps.open && (
            <div className="q declare__gaps">
              <label className="q__label" htmlFor="gaps-reason">
                Why it is sealed with gaps
              </label>
              <p className="q__hint" id="gaps-hint">
                Printed on the cover beside what is missing.
              </p>
              <TextArea
                id="gaps-reason"
                rows={3}
                maxLength={1000}
                aria-describedby="gaps-hint"
                value={gaps.reason}
                onChange={(event) => gaps.setReason(event.target.value)}
              />
            </div>
          )}
        </>
      )}
      <p className="quiet declare__who">
        {name ?? "No competent person recorded"}
        {registration && (
          <>
            , <span className="mono">{registration}</span>
          </>
        )}
        <br />
        {record.firm.name}
      </p>
    </section>
  );
}
