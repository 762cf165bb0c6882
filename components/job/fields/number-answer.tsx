"use client";

import { useState } from "react";
import { Input, WithUnknown } from "@/components/ui/field";
import type { Question } from "../questions/model";
import { numberTyped, type AnswerProps } from "./answer";

type NumberQuestion = Extract<Question, { kind: "number" }>;

const spokenUnit: Record<string, string> = {
  Ω: "ohms",
  "mm²": "square millimetres",
  A: "amps",
  s: "seconds",
  m: "metres",
  MΩ: "megohms",
  "mΩ/m": "milliohms a metre",
  "°C": "degrees Celsius",
  "no.": "number",
};

/** A figure with its unit inside the field, and "Not known" beside it as an equal choice. */
export function NumberAnswer(props: AnswerProps<NumberQuestion>) {
  return props.question.usual ? <UsualNumber {...props} /> : <PlainNumber {...props} />;
}

function PlainNumber(props: AnswerProps<NumberQuestion>) {
  const { question, value, edit, id } = props;
  const field = <NumberInput {...props} />;
  if (!question.notKnown) return field;
  const unknown = question.notKnownValue ?? "unknown";
  return (
    <WithUnknown
      name={`${id}-unknown`}
      label={question.label}
      checked={value === unknown}
      onChange={(checked) => edit(checked ? unknown : null)}
    >
      {field}
    </WithUnknown>
  );
}

function NumberInput({ id, question, value, held, describedBy, edit, hold }: AnswerProps<NumberQuestion>) {
  const [typed, setTyped] = useState<string | null>(null);
  const stored = typeof value === "number" ? String(value) : "";
  const shown = typed ?? (held ? String(held.typed) : stored);
  const take = (text: string) => {
    setTyped(text);
    const number = numberTyped(text);
    if (number === undefined || (question.whole && number !== null && !Number.isInteger(number)))
      hold(text, mustBe(question));
    else edit(number);
  };
  return (
    <Input
      id={id}
      inputMode={question.whole ? "numeric" : "decimal"}
      autoComplete="off"
      value={shown}
      unit={question.unit === "no." ? undefined : question.unit}
      unitName={spokenUnit[question.unit]}
      wrong={held !== null}
      aria-describedby={describedBy}
      onChange={(event) => take(event.target.value)}
      onBlur={() => setTyped(null)}
    />
  );
}

const mustBe = ({ label, whole }: NumberQuestion) =>
  whole ? `${label} must be a whole number, such as 2` : `${label} must be a number, such as 0.21`;

/** The figures met most often as plates, then Other and Not known. */
function UsualNumber(props: AnswerProps<NumberQuestion>) {
  const { id, question, value, held, edit } = props;
  const usual = question.usual ?? [];
  const [wantsOther, setWantsOther] = useState(false);
  const isOther = wantsOther || held !== null || (typeof value === "number" && !usual.includes(value));
  const unknown = question.notKnownValue ?? "unknown";
  const extra = question.notKnown ? 2 : 1;
  const three = usual.length === 3 || usual.length + extra === 3;
  const choose = (next: unknown) => {
    setWantsOther(false);
    edit(next);
  };
  return (
    <>
      <div className={`choices choices--${three && !(usual.length === 3 && extra === 1) ? 3 : 2}`}>
        {usual.map((figure, index) => (
          <label key={figure} className="choice">
            <input
              type="radio"
              id={index === 0 && !isOther ? id : undefined}
              name={id}
              checked={!isOther && value === figure}
              onChange={() => choose(figure)}
              onClick={() => !isOther && value === figure && choose(null)}
            />
            {figure} {question.unit}
          </label>
        ))}
        <label className={usual.length === 3 && extra === 2 ? "choice wide" : "choice"}>
          <input type="radio" name={id} checked={isOther} onChange={() => setWantsOther(true)} />
          Other
        </label>
        {question.notKnown && (
          <label className={usual.length === 3 ? "choice wide" : "choice"}>
            <input
              type="radio"
              name={id}
              checked={!isOther && value === unknown}
              onChange={() => choose(unknown)}
              onClick={() => !isOther && value === unknown && choose(null)}
            />
            Not known
          </label>
        )}
      </div>
      {isOther && (
        <div className="other-figure">
          <label className="vh" htmlFor={id}>
            {question.label}, another figure
          </label>
          <NumberInput {...props} />
        </div>
      )}
    </>
  );
}
