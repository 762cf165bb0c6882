/** Runs once when a server process starts. Only the Node runtime has a database and a queue. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs" || process.env.NEXT_PHASE === "phase-production-build") return;
  const { boot } = await import("./lib/server/boot");
  await boot();
}
