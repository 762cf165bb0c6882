"use client";

import { useRef } from "react";
import { Button } from "@/components/ui/button";
import { Failure } from "@/components/ui/failure";
import { Input, Question } from "@/components/ui/field";
import { errorAt } from "@/components/ui/form-error";
import { OutcomeGlyph } from "@/components/ui/mark";
import { useAct } from "@/components/ui/use-act";
import type { TeamActs } from "./acts";
import { RoleTicks } from "./role-ticks";
import { rolesOf } from "./roles-of";

/** Sends an invitation by e-mail. */
export function InviteForm({ act }: { act: TeamActs["invite"] }) {
  const form = useRef<HTMLFormElement>(null);
  const { state, pending, run } = useAct(act, () => form.current?.reset());
  return (
    <form
      className="form"
      ref={form}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        run({ email: data.get("email"), roles: rolesOf(data) });
      }}
    >
      <Failure state={state} idOf={(path) => `invite-${path.split(/[.[]/)[0]}`} />
      {state.status === "done" && (
        <p className="said" role="status">
          <OutcomeGlyph outcome="met" />
          The invitation is on its way. It can be taken up for 7 days.
        </p>
      )}
      <Question id="invite-email" label="E-mail" error={errorAt(state, "email")}>
        <Input
          id="invite-email"
          name="email"
          type="email"
          autoComplete="off"
          wrong={errorAt(state, "email") !== null}
          aria-describedby={errorAt(state, "email") ? "invite-email-error" : undefined}
        />
      </Question>
      <RoleTicks id="invite-roles" legend="Roles" chosen={["installer"]} error={errorAt(state, "roles")} />
      <Button kind="act" type="submit" disabled={pending}>
        Send the invitation
      </Button>
    </form>
  );
}
