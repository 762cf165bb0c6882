"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { FieldError, Input } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { useAct } from "@/components/ui/use-act";
import type { Outcome } from "@/lib/notify/result";
import { approvalWaits } from "@/lib/notify/review-approval";
import type { ReviewActs } from "./acts";

type Props = {
  reviewId: string;
  version: number;
  tally: Record<Outcome, number>;
  recordedBy: string | null;
  acts: ReviewActs;
};

/**
 * Approve, or return with a reason. What is not met goes back; what cannot be told is for a person to judge, and the
 * judgement is written down.
 */
export function Verdict({ reviewId, version, tally, recordedBy, acts }: Props) {
  const [words, setWords] = useState("");
  const approve = useAct(acts.approve);
  const giveBack = useAct(acts.giveBack);
  const pending = approve.pending || giveBack.pending;
  const waits = approvalWaits(tally, words);
  const returns = tally["not-met"] > 0 || (tally["cannot-tell"] > 0 && waits !== null);
  const state = giveBack.state.status === "failed" ? giveBack.state : approve.state;
  const error = errorAt(state, "reason") ?? errorAt(state, "note");
  return (
    <form
      className="verdict"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (returns) giveBack.run({ reviewId, version, reason: words });
        else approve.run({ reviewId, version, note: words || null });
      }}
    >
      <div className="verdict__failure">
        <Failure state={state} idOf={() => "verdict-words"} />
      </div>
      <label htmlFor="verdict-words">
        {tally["not-met"] > 0 ? "Return with this reason" : "Your note, kept with the decision"}
      </label>
      <p className="verdict__why" id="verdict-waits">
        {waits}
      </p>
      <FieldError id="verdict-words" error={error} />
      <Input
        id="verdict-words"
        value={words}
        onChange={(event) => setWords(event.currentTarget.value)}
        maxLength={2000}
        wrong={error !== null}
        aria-describedby={error ? "verdict-words-error" : undefined}
      />
      <Button
        kind={waits ? "off" : returns ? "outline" : "act"}
        disabled={pending}
        aria-describedby="verdict-waits"
        onClick={() => approve.run({ reviewId, version, note: words || null })}
      >
        Approve
      </Button>
      <Button
        kind={returns ? "act" : "outline"}
        disabled={pending}
        onClick={() => giveBack.run({ reviewId, version, reason: words })}
      >
        Return{recordedBy && ` to ${recordedBy}`}
      </Button>
    </form>
  );
}
