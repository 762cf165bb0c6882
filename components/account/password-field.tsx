"use client";

import { useState } from "react";
import { describedBy, Input, Question } from "@/components/ui/field";

type Props = {
  id?: string;
  label: string;
  hint?: string;
  autoComplete: "current-password" | "new-password";
  error: string | null;
};

/** A password with a button that shows it. Pasting and password managers are welcome. */
export function PasswordField({ id = "password", label, hint, autoComplete, error }: Props) {
  const [shown, setShown] = useState(false);
  return (
    <Question id={id} label={label} hint={hint} error={error}>
      <Input
        id={id}
        name={id}
        type={shown ? "text" : "password"}
        autoComplete={autoComplete}
        autoCapitalize="none"
        spellCheck={false}
        maxLength={128}
        required
        wrong={error !== null}
        aria-describedby={describedBy(id, { hint, error })}
        inside={
          <button type="button" onClick={() => setShown(!shown)} aria-pressed={shown}>
            {shown ? "Hide" : "Show"}
            <span className="vh"> password</span>
          </button>
        }
      />
    </Question>
  );
}
