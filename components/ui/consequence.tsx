import { OutcomeGlyph } from "./mark";

/** What "not known" leads to, under the answer that causes it: the rule, then what to do. */
export function Consequence({ rule, remedy }: { rule: string; remedy: string }) {
  return (
    <div className="consequence" role="status">
      <OutcomeGlyph outcome="cannot-tell" size={20} />
      <p>
        <b className="strong">{rule}</b> {remedy}
      </p>
    </div>
  );
}
