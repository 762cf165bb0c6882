import { log, logSurprise } from "./log";

type Exit = typeof process.exit;

/**
 * On SIGTERM or SIGINT, finish what the queue has in hand before the process ends, for at most `limitMs`.
 * Next drains requests by itself and then calls `process.exit` at once; that call is held until `stop` is done,
 * so both have their turn. A second signal ends at once.
 */
export function drainOnSignal(stop: () => Promise<void>, limitMs: number): void {
  const exit: Exit = process.exit.bind(process);
  let draining: Promise<void> | null = null;
  const begin = () => {
    if (draining) return exit(1);
    log.info("draining");
    const limit = new Promise<void>((resolve) => setTimeout(resolve, limitMs).unref());
    const stopped = stop().catch((error: unknown) => void logSurprise(error, "drain"));
    draining = Promise.race([stopped, limit]);
    process.exit = ((code?: number) => {
      void draining?.then(() => exit(code));
    }) as Exit;
  };
  process.once("SIGTERM", begin);
  process.once("SIGINT", begin);
}
