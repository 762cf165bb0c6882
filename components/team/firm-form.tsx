"use client";

import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { Input, Question, TextArea } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { OutcomeGlyph } from "@/components/ui/mark";
import { answersOf, useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";

export type FirmFields = {
  version: number;
  name: string;
  contactName: string | null;
  phone: string | null;
  email: string | null;
  address: string[];
  registration: string | null;
};

type Props = { firm: FirmFields; act: (input: unknown) => Promise<ActionState<unknown>>; readOnly: boolean };

/** The firm's own facts, asked once here and never in a job. */
export function FirmForm({ firm, act, readOnly }: Props) {
  const { state, pending, run } = useAct(act);
  const field = (
    name: keyof FirmFields,
    label: string,
    optional: boolean,
    more: React.ComponentProps<"input"> = {},
  ) => (
    <Question id={`firm-${name}`} label={label} optional={optional} error={errorAt(state, name)}>
      <Input
        {...more}
        id={`firm-${name}`}
        name={name}
        defaultValue={String(firm[name] ?? "")}
        readOnly={readOnly}
        wrong={errorAt(state, name) !== null}
        aria-describedby={errorAt(state, name) ? `firm-${name}-error` : undefined}
      />
    </Question>
  );
  return (
    <form
      className="form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        run({ version: firm.version, ...answersOf(event.currentTarget) });
      }}
    >
      <Failure state={state} idOf={(path) => `firm-${path}`} />
      {state.status === "done" && (
        <p className="said" role="status">
          <OutcomeGlyph outcome="met" />
          Kept. Jobs opened from now on carry it; open jobs keep theirs.
        </p>
      )}
      {field("name", "Name", false)}
      <div className="form__row">
        {field("contactName", "Contact", true)}
        {field("registration", "Registration", true)}
      </div>
      <div className="form__row">
        {field("phone", "Telephone", true, { type: "tel" })}
        {field("email", "E-mail", true, { type: "email" })}
      </div>
      <Question id="firm-address" label="Address" hint="One line each." optional error={errorAt(state, "address")}>
        <TextArea
          id="firm-address"
          name="address"
          rows={4}
          defaultValue={firm.address.join("\n")}
          readOnly={readOnly}
          wrong={errorAt(state, "address") !== null}
        />
      </Question>
      {!readOnly && (
        <Button type="submit" disabled={pending}>
          Keep these facts
        </Button>
      )}
    </form>
  );
}
