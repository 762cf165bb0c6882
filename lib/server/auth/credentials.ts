import { eq, sql } from "drizzle-orm";
import { passwordMatches } from "./passwords";
import { accountOf, countTry, guesses, noteSuccess } from "./throttle";
import { db } from "@/db/client";
import { users } from "@/db/schema";
import { failed, ok, type Result } from "@/lib/notify/result";

export type Account = { id: string; email: string; name: string; passwordHash: string | null };

/** The account of an address, whatever its case; null when there is none. */
export async function accountByEmail(email: string): Promise<Account | null> {
  const [user] = await db
    .select({ id: users.id, email: users.email, name: users.name, passwordHash: users.passwordHash })
    .from(users)
    .where(eq(sql`lower(${users.email})`, email.trim().toLowerCase()));
  return user ?? null;
}

/**
 * Is this the password of this address? Failures: `throttled`, and `wrong` in the same words and the same time
 * whether the address is unknown or the password is wrong.
 */
export async function checkCredentials(email: string, password: string): Promise<Result<{ userId: string }>> {
  const counted = await countTry(accountOf(email), guesses);
  if (!counted.ok) return counted;
  const account = await accountByEmail(email);
  const matches = await passwordMatches(account?.passwordHash ?? null, password);
  if (!account || !matches) return failed("wrong", "The e-mail address and password do not belong together.");
  await noteSuccess(counted.value);
  return ok({ userId: account.id });
}
