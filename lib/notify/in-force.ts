import { NoValueInForce } from "@/lib/calc/parameter";

/** What `run` gives, or `instead` on a day for which no figure is held. Any other error is passed on. */
export function inForceOr<T>(instead: () => T, run: () => T): T {
  try {
    return run();
  } catch (error) {
    if (error instanceof NoValueInForce) return instead();
    throw error;
  }
}
