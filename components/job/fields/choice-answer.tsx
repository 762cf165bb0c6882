import { Select } from "@/components/ui/field";
import type { Option, Question } from "../questions/model";
import type { AnswerProps } from "./answer";

type Choice = Extract<Question, { kind: "choice" }>;

const withNotKnown = ({ options, notKnown, notKnownValue }: Choice): readonly Option[] =>
  notKnown ? [...options, { value: notKnownValue ?? "unknown", word: "Not known" }] : options;

/** One of a few, as plates; the chosen one, pressed again, is taken back. */
export function ChoiceAnswer({ id, question, value, describedBy, edit, held }: AnswerProps<Choice>) {
  const options = withNotKnown(question);
  if (question.asList)
    return (
      <Select
        id={id}
        value={value === null ? "" : String(value)}
        aria-describedby={describedBy}
        wrong={held !== null}
        onChange={(event) => edit(options.find((option) => String(option.value) === event.target.value)?.value ?? null)}
      >
        <option value="">Choose</option>
        {options.map((option) => (
          <option key={String(option.value)} value={String(option.value)}>
            {option.word}
          </option>
        ))}
      </Select>
    );
  const columns = question.columns ?? 2;
  return (
    <div className={columns === 1 ? "choices" : `choices choices--${columns}`}>
      {options.map((option, index) => (
        <label key={String(option.value)} className={isWide(columns, index, options.length) ? "choice wide" : "choice"}>
          <input
            type="radio"
            id={index === 0 ? id : undefined}
            name={id}
            checked={value === option.value}
            onChange={() => edit(option.value)}
            onClick={() => value === option.value && edit(null)}
          />
          {option.word}
        </label>
      ))}
    </div>
  );
}

/** In three columns, a last row of two is shared evenly. */
const isWide = (columns: number, index: number, count: number) =>
  columns === 3 && count % 3 === 2 && index >= count - 2;
