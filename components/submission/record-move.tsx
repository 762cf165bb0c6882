"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { Input, Question, Select, TextArea } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { answersOf, useAct } from "@/components/ui/use-act";
import type { SubmissionView } from "@/lib/notify/views";
import type { SubmissionActs } from "./acts";

type Move = SubmissionView["moves"][number];
type Props = {
  submission: SubmissionView;
  moves: Move[];
  act: SubmissionActs["recordMove"];
  today: string;
  onDone: () => void;
};

/** What the operator answered. The form asks only what the answer needs. */
export function RecordMove({ submission, moves, act, today, onDone }: Props) {
  const [to, setTo] = useState(moves[0]?.to ?? "");
  const { state, pending, run } = useAct(act, onDone);
  const { id } = submission;
  const move = moves.find((each) => each.to === to);
  if (!move) return null;
  const needs = (need: Move["needs"][number]) => move.needs.includes(need);
  return (
    <form
      className="form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        run({ submissionId: id, version: submission.version, ...answersOf(event.currentTarget) });
      }}
    >
      <Failure state={state} idOf={(path) => `${id}-${path}`} />
      <div className="form__row">
        <Question id={`${id}-move`} label="What happened" error={errorAt(state, "to")}>
          <Select id={`${id}-move`} name="to" value={to} onChange={(event) => setTo(event.currentTarget.value)}>
            {moves.map(({ to: state, label }) => (
              <option key={state} value={state}>
                {label}
              </option>
            ))}
          </Select>
        </Question>
        <Question
          id={`${id}-on`}
          label={needs("decision-day") ? "Day of the decision" : "Day"}
          error={errorAt(state, "on")}
        >
          <Input
            id={`${id}-on`}
            name="on"
            type="date"
            max={today}
            defaultValue={today}
            wrong={errorAt(state, "on") !== null}
          />
        </Question>
      </div>
      <Question
        id={`${id}-reference`}
        label="Operator’s reference"
        optional={!needs("reference")}
        error={errorAt(state, "reference")}
      >
        <Input
          id={`${id}-reference`}
          name="reference"
          className="mono"
          defaultValue={submission.reference ?? ""}
          maxLength={60}
          wrong={errorAt(state, "reference") !== null}
        />
      </Question>
      {(needs("limit") || needs("expires")) && (
        <div className="form__row">
          {needs("limit") && (
            <Question id={`${id}-limitA`} label="Limit" error={errorAt(state, "limitA")}>
              <Input
                id={`${id}-limitA`}
                name="limitA"
                inputMode="decimal"
                unit="A"
                unitName="amps"
                wrong={errorAt(state, "limitA") !== null}
              />
            </Question>
          )}
          {needs("expires") && (
            <Question id={`${id}-expires`} label="Open until" error={errorAt(state, "expires")}>
              <Input id={`${id}-expires`} name="expires" type="date" wrong={errorAt(state, "expires") !== null} />
            </Question>
          )}
        </div>
      )}
      <Question id={`${id}-spokeTo`} label="Who said so" optional>
        <Input id={`${id}-spokeTo`} name="spokeTo" maxLength={120} />
      </Question>
      <Question id={`${id}-note`} label="In their words" optional={!needs("note")} error={errorAt(state, "note")}>
        <TextArea id={`${id}-note`} name="note" rows={3} wrong={errorAt(state, "note") !== null} />
      </Question>
      <Button type="submit" disabled={pending}>
        Record this
      </Button>
    </form>
  );
}
