import type { ReactNode } from "react";
import { FieldError } from "@/components/ui/field";
import { OutcomeGlyph } from "@/components/ui/mark";
import { Stitch, type StitchState } from "@/components/ui/stitch";
import type { Consequence } from "../questions/model";
import { type Wire, WireBeside } from "../wire";

export type Thread = { stitch: StitchState; wire: Wire };

type Props = {
  id: string;
  label: string;
  hint?: string;
  optional?: boolean;
  error: string | null;
  consequence: Consequence | null;
  thread: Thread;
  /** A group of controls carries its label as a legend; a single one as a label. */
  group: boolean;
  children: ReactNode;
};

/** One question: its stitch on the thread, the label, hint and error, the answer, and what the answer leads to. */
export function QuestionFrame({ id, label, hint, optional, error, consequence, thread, group, children }: Props) {
  const words = (
    <>
      {label}
      {optional && <span className="q__optional"> (optional)</span>}
    </>
  );
  const inner = (
    <>
      <WireBeside wire={thread.wire} />
      <Stitch state={thread.stitch} />
      {group ? (
        <legend className="q__label">{words}</legend>
      ) : (
        <label className="q__label" htmlFor={id}>
          {words}
        </label>
      )}
      {hint && (
        <p className="q__hint" id={`${id}-hint`}>
          {hint}
        </p>
      )}
      <FieldError id={id} error={error} />
      {children}
      {consequence && (
        <div className="consequence" id={`${id}-follows`} role="status">
          <OutcomeGlyph outcome="cannot-tell" size={20} />
          <p>
            <b className="strong">{consequence.rule}</b> {consequence.then}
          </p>
        </div>
      )}
    </>
  );
  const described = describing(id, { hint, error, consequence });
  return group ? (
    <fieldset className="q" aria-describedby={described}>
      {inner}
    </fieldset>
  ) : (
    <div className="q">{inner}</div>
  );
}

/** The ids that describe an answer, for `aria-describedby`. */
export const describing = (id: string, has: { hint?: unknown; error?: unknown; consequence?: unknown }) =>
  [has.hint && `${id}-hint`, has.error && `${id}-error`, has.consequence && `${id}-follows`]
    .filter(Boolean)
    .join(" ") || undefined;
