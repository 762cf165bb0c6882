"use client";

import { Input } from "@/components/ui/field";
import type { ChargingWindow } from "@/lib/notify/job/chargepoint";
import type { Question } from "../questions/model";
import type { AnswerProps } from "./answer";

const week = ["mon", "tue", "wed", "thu", "fri", "sat", "sun"] as const;
const dayName: Record<(typeof week)[number], string> = {
  mon: "Mon",
  tue: "Tue",
  wed: "Wed",
  thu: "Thu",
  fri: "Fri",
  sat: "Sat",
  sun: "Sun",
};
/** An empty line to fill in; no hours are supposed. */
const blank: ChargingWindow = { days: [...week], from: "", to: "" };

/** Charging hours: not read, none at all, or windows with their days. */
export function WindowsAnswer({
  id,
  question,
  value,
  held,
  edit,
  hold,
}: AnswerProps<Extract<Question, { kind: "windows" }>>) {
  const windows = (Array.isArray(held?.typed) ? held.typed : Array.isArray(value) ? value : []) as ChargingWindow[];
  const state = windows.length ? "set" : Array.isArray(value) ? "none" : "absent";
  const put = (next: ChargingWindow[]) => {
    if (next.some(({ days, from, to }) => !from || !to || days.length === 0))
      hold(next, `${question.label} need a start, an end and at least one day`);
    else edit(next);
  };
  const change = (at: number, part: Partial<ChargingWindow>) =>
    put(windows.map((window, index) => (index === at ? { ...window, ...part } : window)));
  return (
    <>
      <div className="choices choices--3">
        <Plate id={id} name={id} checked={state === "set"} onChange={() => put([blank])} word="Hours set" />
        <Plate name={id} checked={state === "none"} onChange={() => edit([])} word={question.none} />
        <Plate name={id} checked={state === "absent"} onChange={() => edit(null)} word={question.absent} />
      </div>
      {windows.map((window, at) => (
        <fieldset key={at} className="window">
          <legend className="vh">Hours {at + 1}</legend>
          <div className="window__times">
            <label htmlFor={`${id}-from-${at}`}>From</label>
            <label htmlFor={`${id}-to-${at}`}>To</label>
            <Input
              id={`${id}-from-${at}`}
              type="time"
              value={window.from}
              wrong={held !== null && !window.from}
              onChange={(event) => change(at, { from: event.target.value })}
            />
            <Input
              id={`${id}-to-${at}`}
              type="time"
              value={window.to}
              wrong={held !== null && !window.to}
              onChange={(event) => change(at, { to: event.target.value })}
            />
          </div>
          <div className="choices choices--4">
            {week.map((day) => (
              <label key={day} className="choice">
                <input
                  type="checkbox"
                  checked={window.days.includes(day)}
                  onChange={() =>
                    change(at, { days: week.filter((one) => (one === day) !== window.days.includes(one)) })
                  }
                />
                {dayName[day]}
              </label>
            ))}
            {windows.length > 1 && (
              <button
                type="button"
                className="btn btn--plain"
                onClick={() => put(windows.filter((_, index) => index !== at))}
              >
                Remove<span className="vh"> hours {at + 1}</span>
              </button>
            )}
          </div>
        </fieldset>
      ))}
      {windows.length > 0 && (
        <button type="button" className="btn" onClick={() => put([...windows, blank])}>
          Add hours
        </button>
      )}
    </>
  );
}

type PlateProps = { id?: string; name: string; checked: boolean; onChange: () => void; word: string };

const Plate = ({ id, name, checked, onChange, word }: PlateProps) => (
  <label className="choice">
    <input type="radio" id={id} name={name} checked={checked} onChange={onChange} />
    {word}
  </label>
);
