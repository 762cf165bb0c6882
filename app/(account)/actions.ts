"use server";

import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { z } from "zod";
import { ok, type Result } from "@/lib/notify/result";
import { publicAction, viewerAction } from "@/lib/server/actions";
import { acceptInvitation, requestReset, resetPassword, signIn, signOut } from "@/lib/server/auth/sign-in";

const email = z.email({ error: "Enter an e-mail address, such as sam@example.com" }).trim().max(254);
const password = (message: string) =>
  z.string({ error: message }).min(1, message).max(128, "Use 128 characters or fewer");

const device = async () => ({ userAgent: (await headers()).get("user-agent") });

/** Starts a session and leads to the day's work. */
export const signInAct = publicAction(
  z.object({ email, password: password("Enter your password") }),
  async (input): Promise<Result<null>> => {
    const signedIn = await signIn(input.email, input.password, await device());
    if (signedIn.ok) redirect("/");
    return signedIn;
  },
);

/** Ends this session. */
export const signOutAct = viewerAction(z.object({}), async (): Promise<Result<null>> => {
  await signOut();
  redirect("/sign-in");
});

/** Sends a link to set a new password, if the address has an account. The answer is the same if it has none. */
export const requestResetAct = publicAction(z.object({ email }), async (input): Promise<Result<null>> => {
  const asked = await requestReset(input.email);
  return asked.ok ? ok(null) : asked;
});

/** Sets a new password by a reset link, ends every session, and leads to sign-in. */
export const resetPasswordAct = publicAction(
  z.object({ token: z.string(), password: password("Enter a new password") }),
  async (input): Promise<Result<null>> => {
    const changed = await resetPassword(input.token, input.password);
    if (changed.ok) redirect("/sign-in?changed=1");
    return changed;
  },
);

/** Takes up an invitation, starts a session and leads to the day's work. */
export const acceptInvitationAct = publicAction(
  z.object({
    token: z.string(),
    name: z.string().trim().min(1, "Enter your name").max(120, "Use 120 characters or fewer").default("-"),
    password: password("Enter a password"),
  }),
  async (input): Promise<Result<null>> => {
    const joined = await acceptInvitation(input.token, input, await device());
    if (joined.ok) redirect("/");
    return joined;
  },
);
