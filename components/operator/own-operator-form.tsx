"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { describedBy, Input, Question, Select } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { OutcomeGlyph } from "@/components/ui/mark";
import { answersOf, useAct } from "@/components/ui/use-act";
import { withQuery } from "@/components/ui/query-link";
import type { OwnOperator } from "@/lib/notify/firm-rules";
import type { ActionState } from "@/lib/notify/result";
import { divisionWord, kindWord } from "./operator-words";

type Props = {
  /** The entry to change; null to make one. */ own: OwnOperator | null;
  act: (input: unknown) => Promise<ActionState<OwnOperator>>;
  /** Takes the entry out; absent while one is made. */ remove?: (input: unknown) => Promise<ActionState<unknown>>;
  readOnly?: boolean;
};

/** An operator that the register lacks, as the firm enters it. */
export function OwnOperatorForm({ own, act, remove, readOnly = false }: Props) {
  const router = useRouter();
  const { state, pending, run } = useAct(act, ({ id }) => {
    if (!own) router.push(withQuery(`/operators/${id}`));
  });
  const at = (name: string) => `own-${name}`;
  const described = (name: string, hint?: string) => describedBy(at(name), { hint, error: errorAt(state, name) });
  const twoDigits = "The first two digits of the supply number, when the list does not hold them.";
  const sourceHint = "Who told the firm, or what it read, with its date.";
  return (
    <form
      className="form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        run({ operatorId: own?.id, ...answersOf(event.currentTarget) });
      }}
    >
      <Failure state={state} idOf={at} />
      {state.status === "done" && (
        <p className="said" role="status">
          <OutcomeGlyph outcome="met" />
          Kept. Assessments made from now on name it as the firm’s own entry.
        </p>
      )}
      {!own && (
        <Question id={at("operatorId")} label="Distributor id" hint={twoDigits} error={errorAt(state, "operatorId")}>
          <Input
            id={at("operatorId")}
            name="operatorId"
            inputMode="numeric"
            maxLength={2}
            autoComplete="off"
            wrong={errorAt(state, "operatorId") !== null}
            aria-describedby={described("operatorId", twoDigits)}
          />
        </Question>
      )}
      <Question id={at("name")} label="Name" error={errorAt(state, "name")}>
        <Input
          id={at("name")}
          name="name"
          className="field--words"
          defaultValue={own?.name ?? ""}
          readOnly={readOnly}
          maxLength={120}
          wrong={errorAt(state, "name") !== null}
          aria-describedby={described("name")}
        />
      </Question>
      <div className="form__row">
        <Question id={at("kind")} label="Kind" error={errorAt(state, "kind")}>
          <Select id={at("kind")} name="kind" defaultValue={own?.kind ?? "idno"} disabled={readOnly}>
            <option value="idno">{kindWord.idno}</option>
            <option value="dno">{kindWord.dno}</option>
          </Select>
        </Question>
        <Question id={at("division")} label="Holidays of" error={errorAt(state, "division")}>
          <Select id={at("division")} name="division" defaultValue={own?.division ?? ""} disabled={readOnly}>
            <option value="">The part the site is in</option>
            {Object.entries(divisionWord)
              .filter(([division]) => division !== "northern-ireland")
              .map(([division, words]) => (
                <option key={division} value={division}>
                  {words}
                </option>
              ))}
          </Select>
        </Question>
      </div>
      <Question id={at("from")} label="For work from" error={errorAt(state, "from")}>
        <Input
          id={at("from")}
          name="from"
          type="date"
          defaultValue={own?.from ?? ""}
          readOnly={readOnly}
          wrong={errorAt(state, "from") !== null}
          aria-describedby={described("from")}
        />
      </Question>
      <Question id={at("source")} label="Source" hint={sourceHint} error={errorAt(state, "source")}>
        <Input
          id={at("source")}
          name="source"
          className="field--words"
          defaultValue={own?.source ?? ""}
          readOnly={readOnly}
          maxLength={200}
          wrong={errorAt(state, "source") !== null}
          aria-describedby={described("source", sourceHint)}
        />
      </Question>
      {!readOnly && (
        <div className="form__acts">
          <Button kind={own ? "outline" : "act"} type="submit" disabled={pending}>
            {own ? "Keep this entry" : "Enter this operator"}
          </Button>
          {own && remove && <RemoveOperator operatorId={own.id} act={remove} />}
        </div>
      )}
    </form>
  );
}

/** Takes an entry out that nothing uses; a refusal says what does. */
function RemoveOperator({ operatorId, act }: { operatorId: string; act: NonNullable<Props["remove"]> }) {
  const router = useRouter();
  const { state, pending, run } = useAct(act, () => router.push("/operators"));
  return (
    <>
      <Button kind="plain" disabled={pending} onClick={() => run({ operatorId })}>
        Take this entry out
      </Button>
      {state.status === "failed" && (
        <p className="q__error" role="alert">
          <OutcomeGlyph outcome="not-met" size={18} />
          {state.message}
        </p>
      )}
    </>
  );
}
