"use client";

import { Input, Question } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import type { ActionState } from "@/lib/notify/result";
import { AccountForm } from "./account-form";
import { PasswordField } from "./password-field";

export function SignInForm({ act }: { act: (input: unknown) => Promise<ActionState<null>> }) {
  return (
    <AccountForm act={act} button="Sign in">
      {(state) => (
        <>
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
          <PasswordField label="Password" autoComplete="current-password" error={errorAt(state, "password")} />
        </>
      )}
    </AccountForm>
  );
}
