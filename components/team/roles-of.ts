import { roles, type Role } from "@/lib/notify/roles";

/** The roles ticked in a form, in the order of the register. */
export const rolesOf = (data: FormData): Role[] => {
  const ticked = data.getAll("roles");
  return roles.filter((role) => ticked.includes(role));
};
