import type { ComponentProps, ReactNode } from "react";
import { DownIcon } from "./icons";
import { OutcomeGlyph } from "./mark";

type QuestionProps = {
  id: string;
  label: string;
  hint?: ReactNode;
  optional?: boolean;
  error?: string | null;
  children: ReactNode;
};

/** Ids of the hint and the error of a question, for `aria-describedby`; undefined when there is neither. */
export const describedBy = (id: string, has: { hint?: unknown; error?: unknown }) =>
  [has.hint ? `${id}-hint` : null, has.error ? `${id}-error` : null].filter(Boolean).join(" ") || undefined;

/** A label, a hint, an error (beside the field, same words as the summary), then the answer. */
export function Question({ id, label, hint, optional, error, children }: QuestionProps) {
  return (
    <div className="q">
      <label className="q__label" htmlFor={id}>
        {label}
        {optional && <span className="q__optional"> (optional)</span>}
      </label>
      {hint && (
        <p className="q__hint" id={`${id}-hint`}>
          {hint}
        </p>
      )}
      <FieldError id={id} error={error} />
      {children}
    </div>
  );
}

export function FieldError({ id, error }: { id: string; error?: string | null }) {
  if (!error) return null;
  return (
    <p className="q__error" id={`${id}-error`}>
      <OutcomeGlyph outcome="not-met" size={18} />
      {error}
    </p>
  );
}

type InputProps = ComponentProps<"input"> & {
  id: string;
  unit?: string;
  /** Spoken unit where the sign is not read well: "ohms" for Ω. */ unitName?: string;
  wrong?: boolean;
  /** A button inside the field's edge, such as Show. */ inside?: ReactNode;
};

/** An input of 48 px with its unit in a cell of its own inside the edge. */
export function Input({ unit, unitName, wrong, inside, className, ...input }: InputProps) {
  return (
    <div className={["field", wrong && "is-wrong", className].filter(Boolean).join(" ")}>
      <input {...input} aria-invalid={wrong || undefined} />
      {unit && (
        <span className="field__unit">
          {unitName ? (
            <>
              <span aria-hidden="true">{unit}</span>
              <span className="vh">{unitName}</span>
            </>
          ) : (
            unit
          )}
        </span>
      )}
      {inside}
    </div>
  );
}

/** A list to choose from, drawn as a field with a turn sign. */
export function Select({ wrong, className, children, ...select }: ComponentProps<"select"> & { wrong?: boolean }) {
  return (
    <div className={["field", wrong && "is-wrong", className].filter(Boolean).join(" ")}>
      <select {...select} aria-invalid={wrong || undefined}>
        {children}
      </select>
      <span className="field__turn">
        <DownIcon />
      </span>
    </div>
  );
}

export function TextArea({ wrong, className, ...area }: ComponentProps<"textarea"> & { wrong?: boolean }) {
  return (
    <div className={["field", "field--area", wrong && "is-wrong", className].filter(Boolean).join(" ")}>
      <textarea {...area} aria-invalid={wrong || undefined} />
    </div>
  );
}

/** A field with "Not known" beside it as an equal choice. */
export function WithUnknown({
  name,
  checked,
  onChange,
  words = "Not known",
  label,
  children,
}: {
  name: string;
  checked: boolean;
  onChange?: (checked: boolean) => void;
  words?: string;
  /** What is not known, for screen readers: "External loop impedance". */ label: string;
  children: ReactNode;
}) {
  return (
    <div className="with-unknown">
      {children}
      <label className="choice">
        <input
          type="checkbox"
          name={name}
          checked={checked}
          onChange={(event) => onChange?.(event.currentTarget.checked)}
        />
        {words}
        <span className="vh">: {label}</span>
      </label>
    </div>
  );
}
