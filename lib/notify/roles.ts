/** What a member of a firm may be; one person may be all three. */
export const roles = ["installer", "admin", "compliance"] as const;
export type Role = (typeof roles)[number];

export const roleName: Record<Role, string> = {
  installer: "Installer",
  admin: "Admin",
  compliance: "Compliance lead",
};

/** "Installer, Compliance lead" */
export const rolesInWords = (held: readonly Role[]) => held.map((role) => roleName[role]).join(", ");
