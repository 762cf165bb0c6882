"use client";

import { Input, Select } from "@/components/ui/field";
import type { Cell, Question } from "../questions/model";
import { numberTyped, type AnswerProps } from "./answer";
import { FigureInput } from "./figure-input";

type Row = Record<string, unknown>;

/** A list of things on site: looked and none, or one block a thing. A row without its first answer is not sent yet. */
export function RowsAnswer({
  id,
  question,
  value,
  held,
  describedBy,
  edit,
  hold,
}: AnswerProps<Extract<Question, { kind: "rows" }>>) {
  const rows = (Array.isArray(held?.typed) ? held.typed : Array.isArray(value) ? value : []) as Row[];
  const put = (next: Row[]) => {
    const bad = next.flatMap((row) => question.cells.map((cell) => wrongCell(cell, row[cell.key]))).find(Boolean);
    if (bad) hold(next, bad);
    else edit(next.length ? next : null);
  };
  const change = (at: number, key: string, to: unknown) =>
    put(rows.map((row, index) => (index === at ? { ...row, [key]: to } : row)));
  const isNone = Array.isArray(value) && value.length === 0 && rows.length === 0;
  return (
    <div className="rows">
      {rows.map((row, at) => (
        <fieldset key={at} className="row">
          <legend>
            {question.noun} {at + 1}
          </legend>
          {question.cells.map((cell) => (
            <CellAnswer
              key={cell.key}
              id={at === 0 && cell === question.cells[0] ? id : `${id}-${at}-${cell.key}`}
              cell={cell}
              value={row[cell.key] ?? null}
              describedBy={describedBy}
              wrong={held !== null && wrongCell(cell, row[cell.key]) !== null}
              change={(to) => change(at, cell.key, to)}
            />
          ))}
          <button type="button" className="btn btn--plain" onClick={() => put(rows.filter((_, index) => index !== at))}>
            Remove
            <span className="vh">
              {" "}
              {question.noun} {at + 1}
            </span>
          </button>
        </fieldset>
      ))}
      <div className="choices choices--2">
        <button type="button" id={rows.length ? undefined : id} className="choice" onClick={() => put([...rows, {}])}>
          Add {/^[aeiou]/i.test(question.noun) ? "an" : "a"} {question.noun}
        </button>
        {rows.length === 0 && (
          <button type="button" className="choice" aria-pressed={isNone} onClick={() => edit(isNone ? null : [])}>
            {question.none}
          </button>
        )}
      </div>
    </div>
  );
}

function wrongCell(cell: Cell, value: unknown): string | null {
  if (cell.required && (value === null || value === undefined || value === ""))
    return `${cell.label} is needed for each line`;
  if (cell.kind === "number" && typeof value === "string" && value !== "unknown")
    return `${cell.label} must be a number, such as 10`;
  return null;
}

type CellProps = {
  id: string;
  cell: Cell;
  value: unknown;
  wrong: boolean;
  describedBy: string | undefined;
  change: (to: unknown) => void;
};

function CellAnswer({ id, cell, value, wrong, describedBy, change }: CellProps) {
  const common = { id, wrong, "aria-describedby": wrong ? describedBy : undefined };
  return (
    <div className="row__cell">
      <label htmlFor={id}>{cell.label}</label>
      {cell.kind === "choice" ? (
        <Select
          {...common}
          value={value === null ? "" : String(value)}
          onChange={(event) => change(optionNamed(cell, event.target.value))}
        >
          <option value="">Choose</option>
          {cell.options?.map((option) => (
            <option key={String(option.value)} value={String(option.value)}>
              {option.word}
            </option>
          ))}
          {cell.notKnown && <option value="unknown">Not known</option>}
        </Select>
      ) : cell.kind === "number" ? (
        <FigureInput
          {...common}
          unit={cell.unit}
          placeholder={value === "unknown" ? "not known" : undefined}
          text={value === null || value === "unknown" ? "" : String(value)}
          onText={(text) => change(numberTyped(text) ?? (text || null))}
          inside={
            cell.notKnown && (
              <button
                type="button"
                className="field__inside"
                aria-pressed={value === "unknown"}
                onClick={() => change(value === "unknown" ? null : "unknown")}
              >
                Not known<span className="vh">: {cell.label}</span>
              </button>
            )
          }
        />
      ) : (
        <Input
          {...common}
          className="field--words"
          type={cell.kind === "date" ? "date" : "text"}
          autoComplete="off"
          value={String(value ?? "")}
          onChange={(event) => change(event.target.value || null)}
        />
      )}
    </div>
  );
}

const optionNamed = (cell: Cell, name: string) =>
  name === "unknown" ? name : (cell.options?.find((option) => String(option.value) === name)?.value ?? null);
