"use server";

import { z } from "zod";
import { saveFirm } from "@/db/queries/firms";
import { inviteMember, setRoles, setStatus, withdrawInvitation } from "@/db/queries/team";
import { roles } from "@/lib/notify/roles";
import { viewerAction } from "@/lib/server/actions";

const someRoles = z.array(z.enum(roles)).min(1, "Tick at least one role");

const perhaps = (max: number) =>
  z
    .string()
    .trim()
    .max(max, `Use ${max} characters or fewer`)
    .transform((text) => text || null);

/** Invites somebody by e-mail. */
export const inviteAct = viewerAction(
  z.object({
    email: z.email({ error: "Enter an e-mail address, such as sam@example.com" }).max(254),
    roles: someRoles,
  }),
  inviteMember,
);

/** Changes what a person may do, from their next request on. */
export const setRolesAct = viewerAction(
  z.object({ userId: z.uuid(), roles: someRoles, registration: perhaps(60) }),
  setRoles,
);

/** Suspends a person or lets them back in. */
export const setStatusAct = viewerAction(
  z.object({ userId: z.uuid(), status: z.enum(["active", "suspended"]) }),
  setStatus,
);

/** Withdraws an invitation that nobody has taken up. */
export const withdrawAct = viewerAction(z.object({ id: z.uuid() }), withdrawInvitation);

const lines = z
  .string()
  .max(1000, "Use 1,000 characters or fewer")
  .transform((text) =>
    text
      .split("\n")
      .map((line) => line.trim())
      .filter(Boolean),
  );

/** Keeps the firm's own facts, which each new job takes over. */
export const saveFirmAct = viewerAction(
  z.object({
    version: z.coerce.number().int().positive(),
    name: z.string().trim().min(1, "Enter the firm’s name").max(200, "Use 200 characters or fewer"),
    contactName: perhaps(120),
    phone: perhaps(40),
    email: z.preprocess(
      (value) => value || null,
      z.email({ error: "Enter an e-mail address, or leave it blank" }).max(254).nullable(),
    ),
    address: lines,
    registration: perhaps(60),
  }),
  saveFirm,
);
