import { and, desc, eq, sql } from "drizzle-orm";
import { notFound, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { jobs, packs, users } from "../schema";
import { asFirm } from "../tenant";
import { failed, ok, type Result } from "@/lib/notify/result";
import type { PackView } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";
import { storage } from "@/lib/server/storage/storage";
import type { Tx } from "../client";

export { sealPack } from "./pack-sealing";

const newestVersion = sql<number | null>`(
  select max(newer.version) from packs newer
  where newer.firm_id = "packs"."firm_id" and newer.job_id = "packs"."job_id" and newer.status = 'sealed'
)`;

const columns = {
  id: packs.id,
  jobId: packs.jobId,
  jobNumber: jobs.number,
  version: packs.version,
  status: packs.status,
  progress: packs.progress,
  step: packs.step,
  sha256: packs.sha256,
  bytes: packs.bytes,
  issuedAt: packs.issuedAt,
  sealedBy: users.name,
  ruleset: packs.ruleset,
  gapsReason: packs.gapsReason,
  changes: packs.changes,
  files: packs.files,
  error: packs.error,
  newest: newestVersion,
};

const packRows = (tx: Tx, firmId: string, which: { jobId: string } | { packId: string }) =>
  tx
    .select(columns)
    .from(packs)
    .innerJoin(jobs, and(eq(jobs.firmId, packs.firmId), eq(jobs.id, packs.jobId)))
    .innerJoin(users, eq(users.id, packs.sealedBy))
    .where(and(eq(packs.firmId, firmId), "jobId" in which ? eq(packs.jobId, which.jobId) : eq(packs.id, which.packId)))
    .orderBy(desc(packs.version));

type Row = Awaited<ReturnType<typeof packRows>>[number];

const toView = ({ newest, files, ...row }: Row): PackView => ({
  ...row,
  files: files ?? [],
  supersededBy: newest !== null && newest > row.version ? newest : null,
});

/** Every version of a job's pack, newest first. A job that is not there has none: `not-found`. */
export async function listPacks(viewer: Viewer, { jobId }: { jobId: string }): Promise<Result<PackView[]>> {
  const refused = refusal(viewer, "packs.read");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const rows = await packRows(tx, viewer.firmId, { jobId });
    if (rows.length > 0) return ok(rows.map(toView));
    const job = await tx
      .select({ id: jobs.id })
      .from(jobs)
      .where(and(eq(jobs.firmId, viewer.firmId), eq(jobs.id, jobId)));
    return job.length ? ok([]) : notFound("job");
  });
}

/** One version, with its progress while it is being built. */
export async function getPack(viewer: Viewer, { packId }: { packId: string }): Promise<Result<PackView>> {
  const refused = refusal(viewer, "packs.read");
  if (refused) return refused;
  return asFirm(viewer, async (tx) => {
    const [row] = await packRows(tx, viewer.firmId, { packId });
    return row ? ok(toView(row)) : notFound("pack");
  });
}

export type OpenPack = { stream: ReadableStream<Uint8Array>; bytes: number; fileName: string };

/** The sealed zip as a stream, and the download on record. Failures: `not-found`; `not-sealed` while it is built. */
export async function openPack(viewer: Viewer, { packId }: { packId: string }): Promise<Result<OpenPack>> {
  const refused = refusal(viewer, "packs.read");
  if (refused) return refused;
  const found = await asFirm(viewer, async (tx) => {
    const [pack] = await tx
      .select({ jobId: packs.jobId, jobNumber: jobs.number, version: packs.version, storageKey: packs.storageKey })
      .from(packs)
      .innerJoin(jobs, and(eq(jobs.firmId, packs.firmId), eq(jobs.id, packs.jobId)))
      .where(and(eq(packs.firmId, viewer.firmId), eq(packs.id, packId)));
    return pack ?? null;
  });
  if (!found) return notFound("pack");
  const { jobId, jobNumber, version } = found;
  if (!found.storageKey) return failed("not-sealed", "This version is not sealed yet.");
  const file = await storage().get(found.storageKey);
  if (!file) throw new Error(`the file of pack ${packId} is not in storage`);
  await asFirm(viewer, (tx) =>
    recordEvent(tx, viewer, { type: "pack.downloaded", version: 1, jobId, jobNumber, packId, packVersion: version }),
  );
  return ok({ ...file, fileName: `${jobNumber}-pack-v${version}.zip` });
}
