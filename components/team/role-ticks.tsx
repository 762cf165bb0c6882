"use client";

import { FieldError } from "@/components/ui/field";
import { roleName, roles, type Role } from "@/lib/notify/roles";

type Props = { id: string; legend: string; chosen: readonly Role[]; error: string | null };

/** The roles a person may hold: any, or all three. */
export function RoleTicks({ id, legend, chosen, error }: Props) {
  return (
    <fieldset className="q" aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="q__label">{legend}</legend>
      <FieldError id={id} error={error} />
      <div className="choices choices--across">
        {roles.map((role, index) => (
          <label key={role} className="tick">
            <input
              className="check"
              type="checkbox"
              id={index === 0 ? id : undefined}
              name="roles"
              value={role}
              defaultChecked={chosen.includes(role)}
            />
            {roleName[role]}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
