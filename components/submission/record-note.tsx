"use client";

import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { Input, Question, TextArea } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { answersOf, useAct } from "@/components/ui/use-act";
import type { SubmissionActs } from "./acts";

type Props = { submissionId: string; kind: "call" | "note"; act: SubmissionActs["recordNote"]; onDone: () => void };

/** A call that was made, with the name of who answered, or a note. Neither moves the submission. */
export function RecordNote({ submissionId: id, kind, act, onDone }: Props) {
  const { state, pending, run } = useAct(act, onDone);
  return (
    <form
      className="form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        run({ submissionId: id, kind, ...answersOf(event.currentTarget) });
      }}
    >
      <Failure state={state} idOf={(path) => `${id}-${path}`} />
      {kind === "call" && (
        <Question id={`${id}-spokeTo`} label="Spoke to" error={errorAt(state, "spokeTo")}>
          <Input id={`${id}-spokeTo`} name="spokeTo" maxLength={120} wrong={errorAt(state, "spokeTo") !== null} />
        </Question>
      )}
      <Question id={`${id}-text`} label={kind === "call" ? "What was said" : "Note"} error={errorAt(state, "text")}>
        <TextArea id={`${id}-text`} name="text" rows={3} wrong={errorAt(state, "text") !== null} />
      </Question>
      <Button type="submit" disabled={pending}>
        {kind === "call" ? "Record the call" : "Keep the note"}
      </Button>
    </form>
  );
}
