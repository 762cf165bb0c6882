"use client";

import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { Input, Question, Select, TextArea } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { answersOf, useAct } from "@/components/ui/use-act";
import { submissionChannelName, submissionChannels } from "@/lib/notify/submission";
import type { SubmissionView } from "@/lib/notify/views";
import type { SubmissionActs } from "./acts";

type Props = { submission: SubmissionView; act: SubmissionActs["recordSent"]; today: string; onDone: () => void };

/** What was sent outside this program: by the operator's own page, by post, by telephone, from another mailbox. */
export function RecordSent({ submission, act, today, onDone }: Props) {
  const { state, pending, run } = useAct(act, onDone);
  const { id } = submission;
  const page = submission.sendTo.page;
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
        <Question id={`${id}-channel`} label="How it was sent" error={errorAt(state, "channel")}>
          <Select id={`${id}-channel`} name="channel" defaultValue={page ? "operator-page" : "e-mail"}>
            {submissionChannels.map((channel) => (
              <option key={channel} value={channel}>
                {submissionChannelName[channel]}
              </option>
            ))}
          </Select>
        </Question>
        <Question id={`${id}-sentOn`} label="Day" error={errorAt(state, "sentOn")}>
          <Input
            id={`${id}-sentOn`}
            name="sentOn"
            type="date"
            max={today}
            defaultValue={today}
            wrong={errorAt(state, "sentOn") !== null}
          />
        </Question>
        {submission.packs.length > 0 && (
          <Question id={`${id}-packId`} label="Pack">
            <Select id={`${id}-packId`} name="packId" defaultValue={submission.packId ?? undefined}>
              {submission.packs.map((pack) => (
                <option key={pack.id} value={pack.id}>
                  Version {pack.version}, {pack.hash8}
                </option>
              ))}
            </Select>
          </Question>
        )}
      </div>
      <Question
        id={`${id}-sentTo`}
        label="Sent to"
        hint="The address, page or person, or the receipt they gave."
        error={errorAt(state, "sentTo")}
      >
        <Input
          id={`${id}-sentTo`}
          name="sentTo"
          defaultValue={page ?? submission.sendTo.email ?? ""}
          wrong={errorAt(state, "sentTo") !== null}
        />
      </Question>
      <Question id={`${id}-note`} label="Note" optional>
        <TextArea id={`${id}-note`} name="note" rows={2} />
      </Question>
      <Button type="submit" disabled={pending}>
        Record as sent
      </Button>
    </form>
  );
}
