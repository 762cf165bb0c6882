"use client";

import { useState } from "react";
import { Input } from "@/components/ui/field";
import type { Job } from "@/lib/notify/job";
import type { Question } from "../questions/model";
import { numberTyped, type AnswerProps } from "./answer";
import { FigureInput } from "./figure-input";

const phasesOf = (job: Job) => job.supply.phases ?? 1;

/** One figure a phase. Until every phase has one, what is typed is kept here and not sent. */
export function FiguresAnswer({
  id,
  question,
  value,
  held,
  describedBy,
  edit,
  hold,
  job,
}: AnswerProps<Extract<Question, { kind: "figures" }>> & { job: Job }) {
  const [typed, setTyped] = useState<string[] | null>(null);
  const given = (Array.isArray(held?.typed) ? held.typed : Array.isArray(value) ? value : []).map(String);
  const count = Math.max(phasesOf(job), given.length);
  const shown = typed ?? Array.from({ length: count }, (_, phase) => given[phase] ?? "");
  const take = (phase: number, text: string) => {
    const next = shown.map((before, index) => (index === phase ? text : before));
    setTyped(next);
    const numbers = next.map(numberTyped);
    if (numbers.every((number) => number === null)) edit(null);
    else if (numbers.every((number) => typeof number === "number")) edit(numbers);
    else hold(next, `${question.label} needs one number a phase, such as 24.8`);
  };
  return (
    <div className="figures">
      {shown.map((text, phase) => (
        <Input
          key={phase}
          id={phase === 0 ? id : `${id}-${phase + 1}`}
          inputMode="decimal"
          autoComplete="off"
          aria-label={count > 1 ? `L${phase + 1}, amps` : question.label}
          aria-describedby={describedBy}
          value={text}
          unit={count > 1 ? `L${phase + 1} ${question.unit}` : question.unit}
          wrong={held !== null}
          onChange={(event) => take(phase, event.target.value)}
          onBlur={() => setTyped(null)}
        />
      ))}
    </div>
  );
}

type Triple = [string, string, string];

/** Amps on three phases, a line a state. */
export function TriplesAnswer({
  id,
  value,
  held,
  describedBy,
  edit,
  hold,
}: AnswerProps<Extract<Question, { kind: "triples" }>>) {
  const given = (Array.isArray(held?.typed) ? held.typed : Array.isArray(value) ? value : []) as unknown[][];
  const rows = given.map((row) => row.map(String) as Triple);
  const put = (next: Triple[]) => {
    const numbers = next.map((row) => row.map(numberTyped));
    if (next.length === 0) edit(null);
    else if (numbers.flat().every((number) => typeof number === "number")) edit(numbers);
    else hold(next, "Each state needs three numbers, amps on L1, L2 and L3");
  };
  return (
    <div className="rows">
      {rows.map((row, state) => (
        <div key={state} className="triple">
          {row.map((text: string, phase) => (
            <FigureInput
              key={phase}
              id={state === 0 && phase === 0 ? id : `${id}-${state}-${phase}`}
              aria-label={`State ${state + 1}, L${phase + 1}, amps`}
              aria-describedby={describedBy}
              text={text}
              wrong={held !== null}
              onText={(typed) =>
                put(rows.map((other, index) => (index === state ? replaced(other, phase, typed) : other)))
              }
            />
          ))}
          <button
            type="button"
            className="btn btn--plain"
            onClick={() => put(rows.filter((_, index) => index !== state))}
          >
            Remove<span className="vh"> state {state + 1}</span>
          </button>
        </div>
      ))}
      <button
        type="button"
        id={rows.length ? undefined : id}
        className="btn"
        onClick={() => put([...rows, ["", "", ""]])}
      >
        Add a state
      </button>
    </div>
  );
}

const replaced = (row: Triple, at: number, text: string) =>
  row.map((before, index) => (index === at ? text : before)) as Triple;
