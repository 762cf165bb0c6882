"use client";

import { type ComponentProps, useState } from "react";
import { Input } from "@/components/ui/field";

type Props = Omit<ComponentProps<typeof Input>, "value" | "onChange"> & {
  text: string;
  onText: (text: string) => void;
};

/** A figure in a row of figures. What is being typed is shown as typed, so that "1." can become "1.5". */
export function FigureInput({ text, onText, ...input }: Props) {
  const [typed, setTyped] = useState<string | null>(null);
  return (
    <Input
      {...input}
      inputMode="decimal"
      autoComplete="off"
      value={typed ?? text}
      onChange={(event) => {
        setTyped(event.target.value);
        onText(event.target.value);
      }}
      onBlur={() => setTyped(null)}
    />
  );
}
