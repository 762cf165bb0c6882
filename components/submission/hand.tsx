"use client";

import { useState } from "react";
import { shortDate } from "@/components/ui/dates";
import type { SubmissionState } from "@/lib/notify/submission";
import type { SubmissionView } from "@/lib/notify/views";
import type { SubmissionActs } from "./acts";
import { History } from "./history";
import { Letter } from "./letter";
import { RecordMove } from "./record-move";
import { RecordNote } from "./record-note";
import { RecordSent } from "./record-sent";

type Doing = "letter" | "sent" | "reply" | "call" | "note";
type Props = { submission: SubmissionView; acts: SubmissionActs | null; today: string };

/**
 * One submission in hand: its history at the left, the drafted message and what may be recorded at the right.
 * `acts` is null for somebody who may read but not write.
 */
export function Hand({ submission, acts, today }: Props) {
  const unsent = isUnsent(submission.state);
  const letter = letterWords(submission.state);
  const replies = unsent ? submission.moves.filter(({ to }) => !isSendMove(to)) : submission.moves;
  const first: Doing = letter ? "letter" : replies.length > 0 ? "reply" : "call";
  const [chosen, setChosen] = useState<Doing | null>(null);
  const doing = chosen ?? first;
  const back = () => setChosen(null);
  const pick = { now: doing, pick: setChosen };
  return (
    <div className="hand">
      <History
        entries={submission.history}
        nextStep={submission.nextStep}
        due={submission.dueOn && shortDate(submission.dueOn, today)}
      />
      {acts && (
        <section className="hand__work" aria-label="What to do">
          <div className="hand__choice">
            {letter && <Pick doing="letter" {...pick} words={letter.pick} />}
            {unsent && <Pick doing="sent" {...pick} words="Sent another way" />}
            {replies.length > 0 && <Pick doing="reply" {...pick} words={unsent ? "Withdraw" : "Record a reply"} />}
            <Pick doing="call" {...pick} words="Record a call" />
            <Pick doing="note" {...pick} words="Note" />
          </div>
          {letter && doing === "letter" && (
            <Letter
              key={submission.version}
              submission={submission}
              act={acts.send}
              title={letter.title}
              button={letter.button}
            />
          )}
          {doing === "sent" && <RecordSent submission={submission} act={acts.recordSent} today={today} onDone={back} />}
          {doing === "reply" && (
            <RecordMove
              key={submission.version}
              submission={submission}
              moves={replies}
              act={acts.recordMove}
              today={today}
              onDone={back}
            />
          )}
          {(doing === "call" || doing === "note") && (
            <RecordNote key={doing} submissionId={submission.id} kind={doing} act={acts.recordNote} onDone={back} />
          )}
        </section>
      )}
    </div>
  );
}

const isUnsent = (state: SubmissionState) => state === "draft" || state === "bounced";
const isSendMove = (to: SubmissionState) => to === "queued" || to === "submitted";

/** What a drafted message is for in this state; null where there is nothing to write to the operator. */
function letterWords(state: SubmissionState) {
  if (isUnsent(state)) return { pick: "Send", title: "Message, drafted", button: "Send" };
  if (state === "question") return { pick: "Answer", title: "Answer, drafted", button: "Send the answer" };
  if (state === "submitted" || state === "acknowledged")
    return { pick: "Chase", title: "Chase, drafted", button: "Send chase" };
  return null;
}

type PickProps = { doing: Doing; now: Doing; pick: (doing: Doing) => void; words: string };

const Pick = ({ doing, now, pick, words }: PickProps) => (
  <button type="button" aria-pressed={doing === now} onClick={() => pick(doing)}>
    {words}
  </button>
);
