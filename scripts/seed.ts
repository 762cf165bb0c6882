import { pool } from "@/db/client";
import { seed } from "@/db/seed/seed";

if (!process.env.DATABASE_URL) {
  console.error("Set DATABASE_URL: node scripts/database.mjs url prints it.");
  process.exit(2);
}
const started = Date.now();
const { steps } = await seed();
const seconds = ((Date.now() - started) / 1000).toFixed(1);
console.log(steps === 0 ? "The demo is there already." : `The demo is seeded: ${steps} steps in ${seconds} s.`);
await pool.end();
