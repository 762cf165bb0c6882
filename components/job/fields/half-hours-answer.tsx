"use client";

import { useState } from "react";
import { TextArea } from "@/components/ui/field";
import type { Question } from "../questions/model";
import type { AnswerProps } from "./answer";

type Reading = { start: string; kwh: number };

/** The readings of a text of lines `start, kWh`, or the sentence that says which line is wrong. */
export function readingsOf(text: string): { readings: Reading[] } | { wrong: string } {
  const readings: Reading[] = [];
  for (const [index, line] of text.split(/\r?\n/).entries()) {
    if (line.trim() === "" || (index === 0 && !/\d/.test(line))) continue;
    const [start = "", kwh = ""] = line.split(/[,;\t]/).map((part) => part.trim().replace(/^"|"$/g, ""));
    const number = Number(kwh);
    if (
      !/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2})?(Z|[+-]\d{2}:\d{2})$/.test(start) ||
      kwh === "" ||
      Number.isNaN(number)
    )
      return { wrong: `Line ${index + 1} must be a start and kWh, such as 2026-01-05T18:00:00Z, 3.2` };
    readings.push({ start, kwh: number });
  }
  return { readings };
}

/** Half-hourly readings from a file or typed as lines, with what was read said back. */
export function HalfHoursAnswer({
  id,
  value,
  held,
  describedBy,
  edit,
  hold,
}: AnswerProps<Extract<Question, { kind: "half-hours" }>>) {
  const [typed, setTyped] = useState<string | null>(null);
  const readings = Array.isArray(value) ? (value as Reading[]) : [];
  const stored = readings.map(({ start, kwh }) => `${start}, ${kwh}`).join("\n");
  const take = (text: string) => {
    setTyped(text);
    const read = readingsOf(text);
    if ("wrong" in read) hold(text, read.wrong);
    else edit(read.readings.length ? read.readings : null);
  };
  return (
    <>
      <TextArea
        id={id}
        rows={4}
        value={typed ?? String(held?.typed ?? stored)}
        wrong={held !== null}
        aria-describedby={describedBy}
        spellCheck={false}
        onChange={(event) => take(event.target.value)}
        onBlur={() => setTyped(null)}
      />
      <label className="btn file-button">
        Read a file
        <input
          type="file"
          className="vh"
          accept=".csv,.txt,text/csv,text/plain"
          onChange={async (event) => {
            const file = event.target.files?.[0];
            if (file) take(await file.text());
          }}
        />
      </label>
      {readings.length > 0 && (
        <p className="q__hint" role="status">
          {readings.length} readings, {readings[0]?.start.slice(0, 10)} to {readings.at(-1)?.start.slice(0, 10)},
          highest {Math.max(...readings.map(({ kwh }) => kwh))} kWh.
        </p>
      )}
    </>
  );
}
