"use client";

import { Input, Question } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import type { ActionState } from "@/lib/notify/result";
import { AccountForm } from "./account-form";

export function ForgottenForm({ act }: { act: (input: unknown) => Promise<ActionState<null>> }) {
  return (
    <AccountForm
      act={act}
      button="Send the link"
      done={<p>If that address has an account, a link is on its way. It works once, within 30 minutes.</p>}
    >
      {(state) => (
        <Question id="email" label="E-mail" error={errorAt(state, "email")}>
          <Input
            id="email"
            name="email"
            type="email"
            autoComplete="username"
            autoCapitalize="none"
            spellCheck={false}
            required
            wrong={errorAt(state, "email") !== null}
            aria-describedby={errorAt(state, "email") ? "email-error" : undefined}
          />
        </Question>
      )}
    </AccountForm>
  );
}
