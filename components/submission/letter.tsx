"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { describedBy, Input, Question, TextArea } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { answersOf, useAct } from "@/components/ui/use-act";
import type { SubmissionView } from "@/lib/notify/views";
import type { SubmissionActs } from "./acts";

type Props = { submission: SubmissionView; act: SubmissionActs["send"]; title: string; button: string };

/** The drafted message with the sealed pack attached: read, edit, send. */
export function Letter({ submission, act, title, button }: Props) {
  const { draft, sendTo, id, version, packId } = submission;
  const [editing, setEditing] = useState(sendTo.email === null);
  const { state, pending, run } = useAct(act, () => setEditing(false));
  const answers = submission.state === "question";
  const [unanswered, setUnanswered] = useState(false);
  return (
    <form
      className="letter"
      aria-label={title}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const { answer, ...typed } = answersOf(event.currentTarget);
        const letter = { to: sendTo.email, ...draft, ...typed };
        const words = String(answer ?? "").trim();
        setUnanswered(answers && !words);
        if (answers && !words) document.getElementById(`${id}-answer`)?.focus();
        else run({ submissionId: id, version, packId, ...letter, body: withAnswer(String(letter.body), words) });
      }}
    >
      <h2>{title}</h2>
      <Failure state={state} idOf={(path) => `${id}-${path}`} />
      {editing ? (
        <EditedLetter submission={submission} errorOf={(path) => errorAt(state, path)} />
      ) : (
        <>
          <dl>
            <dt>To</dt>
            <dd>{sendTo.email}</dd>
            <dt>Subject</dt>
            <dd>{draft.subject}</dd>
          </dl>
          <p className="letter__body">{draft.body}</p>
        </>
      )}
      {answers && (
        <div className="form">
          <Question
            id={`${id}-answer`}
            label="Your answer"
            hint="It goes in after what they asked."
            error={unanswered ? "Write your answer" : null}
          >
            <TextArea
              id={`${id}-answer`}
              name="answer"
              rows={3}
              wrong={unanswered}
              aria-describedby={describedBy(`${id}-answer`, { hint: true, error: unanswered })}
            />
          </Question>
        </div>
      )}
      <p className="letter__with">
        {submission.packVersion ? (
          <>
            With pack version {submission.packVersion}, <span className="mono">{submission.packHash8}</span>.
          </>
        ) : (
          "No pack is sealed yet: seal one first."
        )}
      </p>
      <div className="letter__acts">
        <Button type="submit" kind={packId ? "outline" : "off"} disabled={pending}>
          {pending ? "Sending" : button}
        </Button>
        {sendTo.email !== null && (
          <Button kind="plain" onClick={() => setEditing(!editing)} aria-expanded={editing}>
            {editing ? "Back to the draft" : "Edit"}
          </Button>
        )}
      </div>
    </form>
  );
}

/** The answer as a paragraph of its own after the greeting and the question. */
function withAnswer(body: string, answer: string) {
  if (!answer) return body;
  const paragraphs = body.split("\n\n");
  return [...paragraphs.slice(0, 2), answer, ...paragraphs.slice(2)].join("\n\n");
}

function EditedLetter({
  submission: { id, sendTo, draft },
  errorOf,
}: {
  submission: SubmissionView;
  errorOf: (path: string) => string | null;
}) {
  return (
    <div className="form">
      <Question id={`${id}-to`} label="To" error={errorOf("to")}>
        <Input
          id={`${id}-to`}
          name="to"
          type="email"
          defaultValue={sendTo.email ?? ""}
          wrong={errorOf("to") !== null}
        />
      </Question>
      <Question id={`${id}-subject`} label="Subject" error={errorOf("subject")}>
        <Input id={`${id}-subject`} name="subject" defaultValue={draft.subject} wrong={errorOf("subject") !== null} />
      </Question>
      <Question id={`${id}-body`} label="Message" error={errorOf("body")}>
        <TextArea id={`${id}-body`} name="body" rows={7} defaultValue={draft.body} wrong={errorOf("body") !== null} />
      </Question>
    </div>
  );
}
