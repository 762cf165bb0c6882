import type { ReactNode } from "react";
import { FieldError } from "./field";

export type Option = { value: string; label: string; wide?: boolean };

type ChoicesProps = {
  /** Id of the group; the first option carries it, so that the error summary can lead there. */
  id: string;
  name: string;
  legend: string;
  hint?: ReactNode;
  error?: string | null;
  options: readonly Option[];
  value: string | null;
  onChange?: (value: string) => void;
  columns?: 1 | 2 | 3;
  optional?: boolean;
};

/** One choice of a few, as plates of 48 px; the chosen one is filled with ink. "Not known" belongs last. */
export function Choices({
  id,
  name,
  legend,
  hint,
  error,
  options,
  value,
  onChange,
  columns = 2,
  optional,
}: ChoicesProps) {
  const described = [hint ? `${id}-hint` : null, error ? `${id}-error` : null].filter(Boolean).join(" ") || undefined;
  return (
    <fieldset className="q" aria-describedby={described}>
      <legend className="q__label">
        {legend}
        {optional && <span className="q__optional"> (optional)</span>}
      </legend>
      {hint && (
        <p className="q__hint" id={`${id}-hint`}>
          {hint}
        </p>
      )}
      <FieldError id={id} error={error} />
      <div className={columns === 1 ? "choices" : `choices choices--${columns}`}>
        {options.map((option, index) => (
          <label key={option.value} className={option.wide ? "choice wide" : "choice"}>
            <input
              type="radio"
              id={index === 0 ? id : undefined}
              name={name}
              value={option.value}
              checked={value === option.value}
              onChange={() => onChange?.(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}

/** Several of a few, as a list of ticks. */
export function Ticks({
  legend,
  name,
  options,
  values,
  onChange,
}: {
  legend: string;
  name: string;
  options: readonly Option[];
  values: readonly string[];
  onChange?: (values: string[]) => void;
}) {
  return (
    <fieldset className="q">
      <legend className="q__label">{legend}</legend>
      <div className="choices">
        {options.map(({ value, label }) => (
          <label key={value} className="tick">
            <input
              className="check"
              type="checkbox"
              name={name}
              value={value}
              checked={values.includes(value)}
              onChange={(event) =>
                onChange?.(event.currentTarget.checked ? [...values, value] : values.filter((other) => other !== value))
              }
            />
            {label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
