"use client";

import { useState } from "react";
import { Consequence } from "@/components/ui/consequence";
import { longDate } from "@/components/ui/dates";
import { describedBy, Input, Question } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import type { Ground, OwnFigureName } from "@/lib/notify/firm-rules";
import { isLooser } from "@/lib/notify/register-figures";
import type { ActionState } from "@/lib/notify/result";
import { askedFor } from "./own-figures";

type Props = {
  name: OwnFigureName;
  operatorId: string;
  /** What the register has, in words. */ register: string;
  value: number | null;
  ground: Ground | undefined;
  /** Day on which the register's figure is taken. */ today: string;
  state: ActionState<unknown>;
  readOnly: boolean;
};

/** One figure of the firm's own beside the register's, with what it rests on; one that loosens is said while typed. */
export function FigureField({ name, operatorId, register, value, ground, today, state, readOnly }: Props) {
  const [typed, setTyped] = useState(value === null ? "" : String(value));
  const { label, unit, inputMode, hint } = askedFor[name];
  const figure = typed.trim() === "" ? null : Number(typed);
  const looser = figure !== null && figure >= 0 && isLooser(name, figure, operatorId, today);
  const error = errorAt(state, name);
  const from = errorAt(state, `grounds.${name}.from`);
  const source = errorAt(state, `grounds.${name}.source`);
  return (
    <div className="own-figure">
      <Question
        id={name}
        label={label}
        optional
        error={error}
        hint={
          <>
            {hint} <span className="own-figure__register">The register has {register}.</span>
          </>
        }
      >
        <Input
          id={name}
          name={name}
          value={typed}
          onChange={(event) => setTyped(event.currentTarget.value)}
          readOnly={readOnly}
          wrong={error !== null}
          inputMode={inputMode}
          unit={unit}
          aria-describedby={describedBy(name, { hint, error })}
        />
      </Question>
      {looser && (
        <Consequence
          rule="Looser than the register."
          remedy="It will be used, and printed on the cover of every pack it touches as the firm’s to answer for."
        />
      )}
      {figure !== null && (
        <div className="form__row">
          <Question id={`${name}-from`} label="For work from" optional error={from}>
            <Input
              id={`${name}-from`}
              name={`${name}-from`}
              type="date"
              defaultValue={ground?.from ?? ""}
              readOnly={readOnly}
              wrong={from !== null}
              aria-describedby={describedBy(`${name}-from`, { error: from })}
            />
          </Question>
          <Question id={`${name}-source`} label="Source" optional error={source}>
            <Input
              id={`${name}-source`}
              name={`${name}-source`}
              className="field--words"
              defaultValue={ground?.source ?? ""}
              readOnly={readOnly}
              wrong={source !== null}
              maxLength={200}
              aria-describedby={describedBy(`${name}-source`, { error: source })}
            />
          </Question>
        </div>
      )}
      {value !== null && ground && <p className="quiet">Set on {longDate(ground.setOn)}.</p>}
    </div>
  );
}
