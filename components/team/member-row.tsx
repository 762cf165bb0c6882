"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { shortMoment } from "@/components/ui/dates";
import { Input, Question } from "@/components/ui/field";
import { Failure } from "@/components/ui/failure";
import { errorAt } from "@/components/ui/form-error";
import { useAct } from "@/components/ui/use-act";
import { roleName } from "@/lib/notify/roles";
import type { MemberView } from "@/lib/notify/views";
import type { TeamActs } from "./acts";
import { RoleTicks } from "./role-ticks";
import { rolesOf } from "./roles-of";

type Props = { member: MemberView; you: boolean; acts: TeamActs | null };

/** One person: name, roles, when last seen; an admin may change the roles or suspend. */
export function MemberRow({ member, you, acts }: Props) {
  const [changing, setChanging] = useState(false);
  return (
    <>
      <tr className={changing ? "is-open" : undefined}>
        <td className="desk__site">
          {member.name}
          {you && <span className="quiet"> (you)</span>}
        </td>
        <td>{member.email}</td>
        <td>{member.roles.map((role) => roleName[role]).join(", ") || "No role"}</td>
        <td className="mono">{member.registration}</td>
        <td className={member.status === "suspended" ? "is-late" : undefined}>
          {member.status === "suspended" ? "Suspended" : "Active"}
        </td>
        <td className="quiet">{member.lastSeenAt ? shortMoment(member.lastSeenAt) : "never"}</td>
        <td>
          {acts && (
            <Button kind="plain" aria-expanded={changing} onClick={() => setChanging(!changing)}>
              {changing ? "Close" : "Change"}
              <span className="vh"> {member.name}</span>
            </Button>
          )}
        </td>
      </tr>
      {changing && acts && (
        <tr className="in-hand">
          <td colSpan={7}>
            <ChangeMember member={member} you={you} acts={acts} onDone={() => setChanging(false)} />
          </td>
        </tr>
      )}
    </>
  );
}

function ChangeMember({ member, you, acts, onDone }: Props & { acts: TeamActs; onDone: () => void }) {
  const roles = useAct(acts.setRoles, onDone);
  const status = useAct(acts.setStatus, onDone);
  const suspended = member.status === "suspended";
  const { userId } = member;
  return (
    <form
      className="form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        roles.run({ userId, roles: rolesOf(data), registration: data.get("registration") });
      }}
    >
      <Failure state={roles.state} idOf={(path) => `${userId}-${path.split(/[.[]/)[0]}`} />
      <Failure state={status.state} />
      <RoleTicks
        id={`${userId}-roles`}
        legend={`Roles of ${member.name}`}
        chosen={member.roles}
        error={errorAt(roles.state, "roles")}
      />
      <Question
        id={`${userId}-registration`}
        label="Registration with a scheme"
        hint="Stands beside the name of a competent person."
        optional
        error={errorAt(roles.state, "registration")}
      >
        <Input
          id={`${userId}-registration`}
          className="mono"
          name="registration"
          defaultValue={member.registration ?? ""}
          maxLength={60}
        />
      </Question>
      <div className="form__acts">
        <Button type="submit" disabled={roles.pending}>
          Keep this
        </Button>
        {!you && (
          <Button
            kind="plain"
            disabled={status.pending}
            onClick={() => status.run({ userId, status: suspended ? "active" : "suspended" })}
          >
            {suspended ? "Let back in" : "Suspend, and end every session"}
          </Button>
        )}
      </div>
    </form>
  );
}
