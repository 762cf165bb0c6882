import { deleteExpiredSessions } from "./auth/lucia";
import { forgetOldTries } from "./auth/throttle";
import { logSurprise } from "./log";

const everyMs = 60 * 60 * 1000;

async function tidy(): Promise<void> {
  try {
    await deleteExpiredSessions();
    await forgetOldTries();
  } catch (error) {
    logSurprise(error, "housekeeping"); // the next hour tries again
  }
}

/** Clear away sessions and sign-in tries that have run out, now and each hour. Any number of processes may do it. */
export function startHousekeeping(): () => void {
  void tidy();
  const timer = setInterval(() => void tidy(), everyMs);
  timer.unref();
  return () => clearInterval(timer);
}
