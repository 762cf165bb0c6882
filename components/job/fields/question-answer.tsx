"use client";

import type { Held } from "@/components/drafts/draft-state";
import type { Job } from "@/lib/notify/job";
import type { Consequence } from "../questions/model";
import { type AskedQuestion, fieldId } from "../questions/screens";
import { ChoiceAnswer } from "./choice-answer";
import { DateAnswer } from "./date-answer";
import { FiguresAnswer, TriplesAnswer } from "./figures-answer";
import { HalfHoursAnswer } from "./half-hours-answer";
import { NumberAnswer } from "./number-answer";
import { wordsOfError } from "./error-words";
import { describing, QuestionFrame, type Thread } from "./question-frame";
import { RowsAnswer } from "./rows-answer";
import { SeveralAnswer } from "./several-answer";
import { LinesAnswer, TextAnswer } from "./text-answer";
import { WindowsAnswer } from "./windows-answer";

type Props = {
  question: AskedQuestion;
  index: number;
  job: Job;
  value: unknown;
  held: Held | null;
  /** A sentence of the rules about this field: facts that contradict each other. */
  wrong: string | null;
  thread: Thread;
  today: string;
  edit: (path: string, value: unknown) => void;
  hold: (path: string, typed: unknown, message: string) => void;
};

/** Draws one question of the record by its kind. */
export function QuestionAnswer({ question, index, job, value, held, wrong, thread, today, edit, hold }: Props) {
  const id = fieldId(question.at);
  const consequence = consequenceOf(question, value, job, index);
  const error = wordsOfError(question.label, held?.message ?? wrong);
  const common = {
    id,
    value,
    held,
    describedBy: describing(id, { hint: question.hint, error, consequence }),
    edit: (next: unknown) => edit(question.at, next),
    hold: (typed: unknown, message: string) => hold(question.at, typed, message),
  };
  return (
    <QuestionFrame
      id={id}
      label={question.label}
      hint={question.hint}
      optional={question.optional}
      error={error}
      consequence={consequence}
      thread={thread}
      group={isGroup(question)}
    >
      {answerFor(question, common, job, today)}
    </QuestionFrame>
  );
}

const grouped = ["several", "figures", "windows", "rows", "triples"];
const isGroup = (question: AskedQuestion) =>
  grouped.includes(question.kind) ||
  (question.kind === "choice" && !question.asList) ||
  (question.kind === "number" && question.usual !== undefined);

function consequenceOf(question: AskedQuestion, value: unknown, job: Job, index: number): Consequence | null {
  if (question.notKnown && value === (question.notKnownValue ?? "unknown")) return question.notKnown;
  return question.consequence?.(value, job, index) ?? null;
}

type Common = Omit<Parameters<typeof TextAnswer>[0], "question">;

function answerFor(question: AskedQuestion, common: Common, job: Job, today: string) {
  switch (question.kind) {
    case "choice":
      return <ChoiceAnswer {...common} question={question} />;
    case "number":
      return <NumberAnswer {...common} question={question} />;
    case "text":
      return <TextAnswer {...common} question={question} />;
    case "lines":
      return <LinesAnswer {...common} question={question} />;
    case "date":
      return <DateAnswer {...common} question={question} today={today} />;
    case "several":
      return <SeveralAnswer {...common} question={question} />;
    case "figures":
      return <FiguresAnswer {...common} question={question} job={job} />;
    case "windows":
      return <WindowsAnswer {...common} question={question} />;
    case "rows":
      return <RowsAnswer {...common} question={question} />;
    case "triples":
      return <TriplesAnswer {...common} question={question} />;
    case "half-hours":
      return <HalfHoursAnswer {...common} question={question} />;
  }
}
