import type { Role } from "./roles";

/** Who may do what. Closed by default: an act that is not listed for a role is refused. */
export const permissions = {
  "jobs.read": ["installer", "admin", "compliance"],
  "jobs.write": ["installer", "admin"],
  "packs.read": ["installer", "admin", "compliance"],
  "packs.seal": ["installer", "admin"],
  "submissions.read": ["installer", "admin", "compliance"],
  "submissions.write": ["installer", "admin"],
  "reviews.read": ["installer", "admin", "compliance"],
  "reviews.decide": ["compliance"],
  "operators.read": ["installer", "admin", "compliance"],
  "operators.manage": ["admin"],
  "team.read": ["installer", "admin", "compliance"],
  "team.manage": ["admin"],
  "firm.read": ["installer", "admin", "compliance"],
  "firm.manage": ["admin"],
  "activity.read": ["admin", "compliance"],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof permissions;

/** Whether any of a person's roles allows the act. A person without a role may do nothing. */
export function may(roles: readonly Role[], permission: Permission): boolean {
  const allowed: readonly Role[] = permissions[permission];
  return roles.some((role) => allowed.includes(role));
}
