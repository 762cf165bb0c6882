import { may, type Permission } from "@/lib/notify/permissions";
import { failed, type Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";

/** The first line of every query: null when the act is open to this person, else the refusal to return. */
export const refusal = (viewer: Viewer, permission: Permission): Result<never> | null =>
  may(viewer.roles, permission) ? null : failed("forbidden", "Your roles in this firm do not include this.");

/** Whether a text can be the id of a row: PostgreSQL refuses any other text, and a miss is only "not found". */
export const isRowId = (text: string): boolean => /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(text);

/** A row that is not there, or is another firm's: the same words for both. */
export const notFound = (what: string): Result<never> => failed("not-found", `There is no such ${what}.`);

/** Somebody else was first; what is on the screen is behind. */
export const movedOn = (what: string): Result<never> =>
  failed("conflict", `This ${what} has moved on since you opened it. Load it again and look before you act.`);
