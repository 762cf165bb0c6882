"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Choices } from "@/components/ui/choices";
import { ErrorSummary } from "@/components/ui/error-summary";
import { Input, Question, Select, TextArea } from "@/components/ui/field";
import { useAct } from "@/components/ui/use-act";
import type { ActionState, FieldError } from "@/lib/notify/result";
import { openJob } from "./open-job";
import { fieldId } from "./questions/screens";
import { premises, territories } from "./questions/words";

type Props = {
  today: string;
  copyOf: string | null;
  earlier: readonly { id: string; words: string }[];
  copy: (input: unknown) => Promise<ActionState<{ id: string; number: string }>>;
};

const blank = {
  stage: "",
  day: "",
  customer: "",
  phone: "",
  address: "",
  postcode: "",
  supplyNumber: "",
  territory: "",
  premises: "",
};

const stageMissing = { path: "stage", message: "Choose whether the job is planned or installed" };

/** The first facts of a job. The first screen of the walk follows at once. */
export function NewJob({ today, copyOf, earlier, copy }: Props) {
  const router = useRouter();
  const [from, setFrom] = useState(copyOf && earlier.some(({ id }) => id === copyOf) ? copyOf : "");
  const [typed, setTyped] = useState(blank);
  const [ids] = useState(() => ({ id: crypto.randomUUID(), saveId: crypto.randomUUID() }));
  const [wrong, setWrong] = useState<{ message: string; fields: readonly FieldError[] } | null>(null);
  const [pending, setPending] = useState(false);
  const toWalk = ({ id }: { id: string }) => router.push(`/jobs/${id}/record/${from ? "people" : "intake"}` as Route);
  const act = useAct(copy, toWalk);
  const set = (part: Partial<typeof blank>) => setTyped({ ...typed, ...part });
  const errorAt = (path: string) => wrong?.fields.find((field) => field.path === path)?.message ?? null;
  const submit = async () => {
    if (from) return act.run({ jobId: from, id: ids.id });
    if (!typed.stage) return setWrong({ message: "", fields: [stageMissing] });
    setPending(true);
    const answer = await openJob(ids, typed);
    setPending(false);
    if (answer.ok) return toWalk(answer.value);
    setWrong({ message: answer.error.message, fields: answer.error.fields ?? [] });
  };
  const failed = act.state.status === "failed" ? act.state : wrong;
  return (
    <form
      className="form new-job"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        void submit();
      }}
    >
      {failed && (
        <ErrorSummary errors={failed.fields} idOf={fieldId} title={failed.fields.length ? undefined : failed.message} />
      )}
      <Question id="from" label="Start from" hint="A copy takes the unit, the circuit and the settings, not the site.">
        <Select id="from" value={from} onChange={(event) => setFrom(event.target.value)}>
          <option value="">A blank job</option>
          {earlier.map(({ id, words }) => (
            <option key={id} value={id}>
              {words}
            </option>
          ))}
        </Select>
      </Question>
      {!from && <FirstFacts typed={typed} set={set} errorAt={errorAt} today={today} />}
      <div className="form__acts">
        <Button kind="act" type="submit" disabled={pending || act.pending} className="new-job__go">
          {pending || act.pending ? "Opening" : from ? "Open the copy" : "Open the job"}
        </Button>
      </div>
    </form>
  );
}

type FirstProps = {
  typed: typeof blank;
  set: (part: Partial<typeof blank>) => void;
  errorAt: (path: string) => string | null;
  today: string;
};

function FirstFacts({ typed, set, errorAt, today }: FirstProps) {
  const dayPath = typed.stage === "installed" ? "dates.installed" : "dates.planned";
  const text = (path: string, key: "customer" | "phone" | "postcode" | "supplyNumber", label: string, more = {}) => (
    <Question id={fieldId(path)} label={label} optional error={errorAt(path)}>
      <Input
        id={fieldId(path)}
        value={typed[key]}
        autoComplete="off"
        wrong={errorAt(path) !== null}
        onChange={(event) => set({ [key]: event.target.value })}
        {...more}
      />
    </Question>
  );
  return (
    <>
      <Choices
        id={fieldId("stage")}
        name="stage"
        legend="The job is"
        options={[
          { value: "planned", label: "Planned" },
          { value: "installed", label: "Installed" },
        ]}
        value={typed.stage}
        error={errorAt("stage")}
        onChange={(stage) => set({ stage })}
      />
      <Question
        id={fieldId(dayPath)}
        label={typed.stage === "installed" ? "Installed on" : typed.stage === "planned" ? "Planned for" : "Day"}
        optional={typed.stage !== "installed"}
        error={errorAt(dayPath)}
      >
        <div className="with-unknown">
          <Input
            id={fieldId(dayPath)}
            type="date"
            value={typed.day}
            wrong={errorAt(dayPath) !== null}
            onChange={(event) => set({ day: event.target.value })}
          />
          <button
            type="button"
            className="choice"
            aria-pressed={typed.day === today}
            onClick={() => set({ day: today })}
          >
            Today
          </button>
        </div>
      </Question>
      {text("customer.name", "customer", "Customer’s name", { className: "field--words" })}
      {text("customer.phone", "phone", "Customer’s telephone", { type: "tel", inputMode: "tel" })}
      <Question
        id={fieldId("site.address")}
        label="Address of the site"
        hint="Street first, town last, without the postcode."
        optional
        error={errorAt("site.address")}
      >
        <TextArea
          id={fieldId("site.address")}
          rows={3}
          value={typed.address}
          wrong={errorAt("site.address") !== null}
          aria-describedby={`${fieldId("site.address")}-hint`}
          onChange={(event) => set({ address: event.target.value })}
        />
      </Question>
      {text("site.postcode", "postcode", "Postcode", { autoCapitalize: "characters" })}
      {text("site.supplyNumber", "supplyNumber", "Supply number", { inputMode: "numeric" })}
      <Question id={fieldId("site.territory")} label="Country" optional error={errorAt("site.territory")}>
        <Select
          id={fieldId("site.territory")}
          value={typed.territory}
          onChange={(event) => set({ territory: event.target.value })}
        >
          <option value="">Choose</option>
          {territories.map(({ value, word }) => (
            <option key={String(value)} value={String(value)}>
              {word}
            </option>
          ))}
        </Select>
      </Question>
      <Question id={fieldId("site.premises")} label="Premises" optional error={errorAt("site.premises")}>
        <Select
          id={fieldId("site.premises")}
          value={typed.premises}
          onChange={(event) => set({ premises: event.target.value })}
        >
          <option value="">Choose</option>
          {premises.map(({ value, word }) => (
            <option key={String(value)} value={String(value)}>
              {word}
            </option>
          ))}
        </Select>
      </Question>
    </>
  );
}
