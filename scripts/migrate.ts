import { migrate } from "@/db/migrate";

const ownerUrl = process.env.DATABASE_OWNER_URL ?? process.env.DATABASE_URL;
if (!ownerUrl) {
  console.error("Set DATABASE_OWNER_URL: node scripts/database.mjs url --owner prints it.");
  process.exit(2);
}
await migrate(ownerUrl);
