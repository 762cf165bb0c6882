"use client";

import { Input, Question } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import type { ActionState } from "@/lib/notify/result";
import { AccountForm } from "./account-form";
import { PasswordField } from "./password-field";

type Props = {
  act: (input: unknown) => Promise<ActionState<null>>;
  token: string;
  /** Asks for the name too: an invitation. */ withName?: boolean;
  /** The address has an account: its present password is asked, not a new one. */ known?: boolean;
  button: string;
};

/** A new password, for a reset or an invitation. */
export function NewPasswordForm({ act, token, withName, known = false, button }: Props) {
  return (
    <AccountForm act={act} also={{ token }} button={button}>
      {(state) => (
        <>
          {withName && (
            <Question id="name" label="Your name" error={errorAt(state, "name")}>
              <Input
                id="name"
                name="name"
                autoComplete="name"
                required
                wrong={errorAt(state, "name") !== null}
                aria-describedby={errorAt(state, "name") ? "name-error" : undefined}
              />
            </Question>
          )}
          <PasswordField
            label={known ? "Password" : "New password"}
            hint={known ? undefined : "12 characters or more. A few unrelated words do well."}
            autoComplete={known ? "current-password" : "new-password"}
            error={errorAt(state, "password")}
          />
        </>
      )}
    </AccountForm>
  );
}
