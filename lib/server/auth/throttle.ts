import { and, count, eq, gt, lt, min, sql } from "drizzle-orm";
import { tokenHash } from "./tokens";
import { db } from "@/db/client";
import { signInAttempts } from "@/db/schema";
import { failed, ok, type Result } from "@/lib/notify/result";

/** OWASP ASVS 5.0 6.3.1 asks for a limit and leaves the figures open; these are the project's own bar. */
export const guesses = { most: 10, windowMinutes: 5 } as const;
export const resetRequests = { most: 3, windowMinutes: 60 } as const;

/** An account by the address that was typed, whether or not anybody has it. */
export const accountOf = (email: string, act: "sign-in" | "reset" = "sign-in"): string =>
  tokenHash(`${act} ${email.trim().toLowerCase()}`);

/**
 * Count one try against an account, before it is made. The count is kept in PostgreSQL, so that every process
 * sees it, and taken under a lock, so that tries sent at once are all counted.
 * Failure `throttled` with the wait in words; a refused try is not counted and does not lengthen the wait.
 * @returns the id of the try, for `noteSuccess`
 */
export async function countTry(
  account: string,
  limit: { most: number; windowMinutes: number },
): Promise<Result<number>> {
  return db.transaction(async (tx) => {
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${account}, 0))`);
    const since = sql`now() - make_interval(mins => ${limit.windowMinutes})`;
    const [recent] = await tx
      .select({ tries: count(), oldest: min(signInAttempts.at), now: sql<string>`now()` })
      .from(signInAttempts)
      .where(
        and(eq(signInAttempts.account, account), gt(signInAttempts.at, since), eq(signInAttempts.succeeded, false)),
      );
    if (recent && recent.tries >= limit.most) {
      const oldest = Date.parse(recent.oldest ?? recent.now);
      const waitMs = oldest + limit.windowMinutes * 60_000 - Date.parse(recent.now);
      const minutes = Math.max(1, Math.ceil(waitMs / 60_000));
      return failed("throttled", `Too many tries. Wait ${minutes} minute${minutes === 1 ? "" : "s"}, then try again.`);
    }
    const [made] = await tx.insert(signInAttempts).values({ account }).returning({ id: signInAttempts.id });
    if (!made) throw new Error("a sign-in attempt was not stored");
    return ok(made.id);
  });
}

/** A try that turned out right no longer counts. */
export async function noteSuccess(attempt: number): Promise<void> {
  await db.update(signInAttempts).set({ succeeded: true }).where(eq(signInAttempts.id, attempt));
}

/** Delete tries older than a day; nothing reads them. */
export async function forgetOldTries(): Promise<void> {
  await db.delete(signInAttempts).where(lt(signInAttempts.at, sql`now() - interval '1 day'`));
}
