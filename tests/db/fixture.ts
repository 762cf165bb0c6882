import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { Client } from "pg";
import { createJob, getJob } from "@/db/queries/jobs";
import { buildPack } from "@/db/queries/pack-build";
import { sealPack } from "@/db/queries/packs";
import { firms, members } from "@/db/schema";
import { asFirm } from "@/db/tenant";
import type { Result } from "@/lib/notify/result";
import type { Role } from "@/lib/notify/roles";
import type { Viewer } from "@/lib/server/auth/viewer";
import notice from "@/tests/examples/fen-0147-notice.json";
import { makeFirm, makeViewer } from "@/tests/support/people";

/** The value of a result that the test needs to go on; the failure in words otherwise. */
export function value<T>(result: Result<T>): T {
  if (!result.ok)
    throw new Error(`${result.error.code}: ${result.error.message} ${JSON.stringify(result.error.fields)}`);
  return result.value;
}

export const codeOf = (result: Result<unknown>): string => (result.ok ? "ok" : result.error.code);

export async function registered(viewer: Viewer): Promise<Viewer> {
  await asFirm(viewer, (tx) =>
    tx
      .update(members)
      .set({ registration: "REG-1" })
      .where(and(eq(members.firmId, viewer.firmId), eq(members.userId, viewer.userId))),
  );
  return viewer;
}

/** A firm of its own with one person who holds every role and may seal. */
export async function soleTrader(name?: string): Promise<Viewer> {
  const viewer = await registered(await makeViewer(await makeFirm(name), ["installer", "admin", "compliance"]));
  const facts = { phone: "01632 960200", email: "office@thrale.example.com", address: ["1 Mill Yard", "Thrale"] };
  await asFirm(viewer, (tx) => tx.update(firms).set({ ...facts, registration: "REG-1", contactName: viewer.name }));
  return viewer;
}

export const colleague = (viewer: Viewer, roles: Role[]): Promise<Viewer> => makeViewer(viewer.firmId, roles);

type Example = typeof notice;

/** The record of the worked example FEN-0147, which notifies, with a test's own changes. */
export function exampleRecord(change: (record: Example) => void = () => undefined): Example {
  const record = structuredClone(notice);
  record.evidence = [];
  change(record);
  return record;
}

export async function openJob(viewer: Viewer, record: unknown = exampleRecord()): Promise<string> {
  const id = randomUUID();
  value(await createJob(viewer, { id, saveId: randomUUID(), record }));
  return id;
}

export async function seal(viewer: Viewer, jobId: string, gapsReason: string | null = null) {
  const { version } = value(await getJob(viewer, { jobId }));
  const declaration = { name: viewer.name, statement: "What is recorded here is what I saw." };
  return sealPack(viewer, { jobId, packId: randomUUID(), expectedVersion: version, declaration, gapsReason });
}

/** Seals and builds, as the queue's worker would. */
export async function sealAndBuild(viewer: Viewer, jobId: string, gapsReason: string | null = null): Promise<string> {
  const { packId } = value(await seal(viewer, jobId, gapsReason));
  await buildPack(packId, viewer.firmId);
  return packId;
}

/** A connection of the role that owns the tables, or of the superuser, whom policies do not bind. */
export async function connected<T>(as: "owner" | "admin" | "app", act: (client: Client) => Promise<T>): Promise<T> {
  const names = { owner: "DATABASE_OWNER_URL", admin: "DATABASE_ADMIN_URL", app: "DATABASE_URL" } as const;
  const client = new Client({ connectionString: process.env[names[as]] });
  await client.connect();
  try {
    return await act(client);
  } finally {
    await client.end();
  }
}
