"use client";

import { useState } from "react";
import { Input, TextArea } from "@/components/ui/field";
import { tidyPostcode } from "../postcode";
import type { Question } from "../questions/model";
import type { AnswerProps } from "./answer";

type TextQuestion = Extract<Question, { kind: "text" }>;

/** One line, or several, of text. What is being typed is shown as typed; the record holds it trimmed. */
export function TextAnswer({ id, question, value, held, describedBy, edit }: AnswerProps<TextQuestion>) {
  const [typed, setTyped] = useState<string | null>(null);
  const shown = typed ?? String(held?.typed ?? value ?? "");
  const common = {
    id,
    value: shown,
    wrong: held !== null,
    "aria-describedby": describedBy,
    autoComplete: "off",
    onBlur: () => {
      setTyped(null);
      if (question.complete === "postal-code" && typed?.trim()) edit(tidyPostcode(typed));
    },
    onChange: (event: { target: { value: string } }) => {
      setTyped(event.target.value);
      edit(event.target.value.trim() === "" ? null : event.target.value);
    },
  };
  if (question.lines) return <TextArea {...common} rows={question.lines} />;
  return (
    <Input
      {...common}
      className={question.mono ? undefined : "field--words"}
      type={question.input ?? "text"}
      inputMode={question.input === "tel" ? "tel" : question.input === "email" ? "email" : undefined}
      spellCheck={!question.mono && question.input === undefined}
      autoCapitalize={question.mono ? "characters" : undefined}
    />
  );
}

type LinesQuestion = Extract<Question, { kind: "lines" }>;

/** An address: a line each, blank ones left out. */
export function LinesAnswer({ id, value, held, describedBy, edit }: AnswerProps<LinesQuestion>) {
  const [typed, setTyped] = useState<string | null>(null);
  const stored = Array.isArray(held?.typed) ? held.typed : Array.isArray(value) ? value : [];
  const take = (text: string) => {
    setTyped(text);
    const lines = text.split("\n").filter((line) => line.trim() !== "");
    edit(lines.length ? lines : null);
  };
  return (
    <TextArea
      id={id}
      rows={3}
      value={typed ?? stored.join("\n")}
      wrong={held !== null}
      aria-describedby={describedBy}
      autoComplete="off"
      onBlur={() => setTyped(null)}
      onChange={(event) => take(event.target.value)}
    />
  );
}
