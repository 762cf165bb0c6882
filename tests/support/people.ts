import { randomUUID } from "node:crypto";
import { asFirmId } from "@/db/tenant";
import { db } from "@/db/client";
import { firms, members, users } from "@/db/schema";
import type { Role } from "@/lib/notify/roles";
import { hashPassword } from "@/lib/server/auth/passwords";
import { viewerOfUser, type Viewer } from "@/lib/server/auth/viewer-of-session";

export const testPassword = "copper-wire-seal-7";

/** A firm of its own for a test, so that tests do not see each other's rows. */
export async function makeFirm(name = "Thrale Wiring Ltd"): Promise<string> {
  const id = randomUUID();
  await asFirmId(id, async (tx) => {
    await tx.insert(firms).values({ id, name, numberPrefix: "THR" });
  });
  return id;
}

/** A person of a firm with these roles, signed up with `testPassword`, as the Viewer a session of theirs would give. */
export async function makeViewer(firmId: string, roles: Role[]): Promise<Viewer> {
  const userId = randomUUID();
  const email = `${userId.slice(0, 8)}@thrale.example.com`;
  const name = "Wyn Tarrow";
  await db.insert(users).values({ id: userId, email, name, passwordHash: await hashPassword(testPassword) });
  await asFirmId(firmId, async (tx) => {
    await tx.insert(members).values({ firmId, userId, roles });
  });
  const viewer = await viewerOfUser({ userId, name, email });
  if (!viewer) throw new Error("the test person has no place in the firm");
  return viewer;
}
