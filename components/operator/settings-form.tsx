"use client";

import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { describedBy, Input, Question, TextArea } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { OutcomeGlyph } from "@/components/ui/mark";
import { answersOf, useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";
import type { OperatorRow } from "@/lib/notify/views";
import { FigureField } from "./figure-field";
import { figureOrder } from "./own-figures";

type Props = {
  row: OperatorRow;
  today: string;
  act: (input: unknown) => Promise<ActionState<unknown>>;
  /** A person who may read but not change sees the same fields, closed. */ readOnly: boolean;
};

type Contact = "noticeEmail" | "applicationEmail" | "phone" | "page";

/** What this firm knows of an operator: where papers go, and figures of its own in place of the register's. */
export function SettingsForm({ row, today, act, readOnly }: Props) {
  const { state, pending, run } = useAct(act);
  const { settings } = row;
  const field = (name: Contact, label: string, type: "email" | "tel" | "url", hint?: string) => (
    <Question id={name} label={label} hint={hint} optional error={errorAt(state, name)}>
      <Input
        id={name}
        name={name}
        defaultValue={settings[name] ?? ""}
        readOnly={readOnly}
        wrong={errorAt(state, name) !== null}
        type={type}
        aria-describedby={describedBy(name, { hint, error: errorAt(state, name) })}
      />
    </Question>
  );
  return (
    <form
      className="form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        run(settingsIn(row.id, answersOf(event.currentTarget)));
      }}
    >
      <Failure state={state} idOf={idOf} />
      {state.status === "done" && (
        <p className="said" role="status">
          <OutcomeGlyph outcome="met" />
          Kept. Assessments made from now on use it and say so.
        </p>
      )}
      <div className="form__row">
        {field("noticeEmail", "Notices go to", "email", whileBlank(row.noticeMailbox))}
        {field("applicationEmail", "Applications go to", "email", whileBlank(row.applicationMailbox))}
      </div>
      <div className="form__row">
        {field("phone", "Connections desk", "tel")}
        {field("page", "Their own page", "url")}
      </div>
      <h3>Figures of the firm’s own</h3>
      <p className="quiet">
        Left blank, the register’s figure holds. A tighter one is used and named in the reasons; a looser one is also
        printed on the cover.
      </p>
      {figureOrder.map((name) => (
        <FigureField
          key={name}
          name={name}
          operatorId={row.id}
          register={row.register[name].words}
          value={settings[name]}
          ground={settings.grounds[name]}
          today={today}
          state={state}
          readOnly={readOnly}
        />
      ))}
      <Question id="note" label="Note" optional error={errorAt(state, "note")}>
        <TextArea id="note" name="note" rows={3} defaultValue={settings.note ?? ""} readOnly={readOnly} />
      </Question>
      {!readOnly && (
        <Button kind="act" type="submit" disabled={pending}>
          Keep these settings
        </Button>
      )}
    </form>
  );
}

/** `grounds.noticeDays.from` is the field `noticeDays-from`. */
const idOf = (path: string) => path.replace(/^grounds\./, "").replace(".", "-");

/** The answers in the shape of the act: what each figure rests on gathered under `grounds`. */
function settingsIn(operatorId: string, answers: Record<string, unknown>) {
  const grounds = Object.fromEntries(
    figureOrder.map((name) => [
      name,
      { from: answers[`${name}-from`] ?? null, source: answers[`${name}-source`] ?? null },
    ]),
  );
  return { operatorId, ...answers, grounds };
}

const whileBlank = (mailbox: string | null) => (mailbox ? `While blank: ${mailbox}` : undefined);
