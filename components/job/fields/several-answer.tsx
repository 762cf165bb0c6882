import type { Question } from "../questions/model";
import type { AnswerProps } from "./answer";

/** Any of several. An answer that stands alone clears the others; "None" is an answer too. */
export function SeveralAnswer({ id, question, value, edit }: AnswerProps<Extract<Question, { kind: "several" }>>) {
  const chosen = Array.isArray(value) ? (value as string[]) : [];
  const known = question.options.map((option) => String(option.value));
  const others = chosen.filter((one) => !known.includes(one)).map((one) => ({ value: one, word: one }));
  const alone = question.alone ?? [];
  const toggle = (one: string) => {
    if (chosen.includes(one)) {
      const left = chosen.filter((other) => other !== one);
      edit(left.length ? left : null);
    } else if (alone.includes(one)) edit([one]);
    else edit([...chosen.filter((other) => !alone.includes(other)), one]);
  };
  return (
    <div className={known.length > 4 && !question.alone ? "choices choices--4" : "choices choices--2"}>
      {[...question.options, ...others].map(({ value: one, word }, index) => (
        <label key={String(one)} className="choice">
          <input
            type="checkbox"
            id={index === 0 ? id : undefined}
            name={id}
            checked={chosen.includes(String(one))}
            onChange={() => toggle(String(one))}
          />
          {word}
        </label>
      ))}
      {!question.alone && (
        <label className="choice">
          <input
            type="checkbox"
            name={id}
            checked={Array.isArray(value) && chosen.length === 0}
            onChange={(event) => edit(event.target.checked ? [] : null)}
          />
          None
        </label>
      )}
    </div>
  );
}
