import { hash, verify } from "@node-rs/argon2";
import { holdsOwnName, isCommonPassword } from "./common-passwords";
import { failed, ok, type Result } from "@/lib/notify/result";

/** Argon2id, the least cost the OWASP Password Storage Cheat Sheet gives for it: 19 MiB, 2 passes, 1 lane. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** Each hash holds 19 MiB and a core, so a burst of sign-ins queues here instead of starving the rest. */
const atMost = 2;
let running = 0;
const waiting: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= atMost) await new Promise<void>((resolve) => waiting.push(resolve));
  else running += 1;
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}

/** The stored form of a password. */
export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(password, cost));

/** A hash of nothing anyone knows, checked when there is no account, so that the time taken tells nothing. */
let nobody: Promise<string> | null = null;

/**
 * Does the password belong to the hash? With no hash (unknown account, or one that never set a password)
 * the same work is done and the answer is false.
 */
export async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
  nobody ??= hashPassword(crypto.randomUUID());
  const against = stored ?? (await nobody);
  const matches = await inTurn(() => verify(against, password));
  return stored !== null && matches;
}

/**
 * May this be somebody's password? 12 to 128 characters, no rules about which, and not a common one.
 * Failure `invalid` with the field `password`.
 */
export function acceptablePassword(password: string, email: string, name: string): Result<string> {
  const refuse = (message: string) => failed("invalid", message, [{ path: "password", message }]);
  const length = [...password].length;
  if (length < 12) return refuse("Use at least 12 characters. Three or four unrelated words work well.");
  if (length > 128) return refuse("Use at most 128 characters.");
  if (isCommonPassword(password)) return refuse("This is one of the first a thief would try. Use unrelated words.");
  if (holdsOwnName(password, email, name)) return refuse("Leave your own name and e-mail address out of it.");
  return ok(password);
}
