import { and, eq, ne } from "drizzle-orm";
import { nowInstant } from "../clock";
import type { Tx } from "../client";
import { recordEvent } from "../record-event";
import { jobs, packs, users } from "../schema";
import { refreshStanding } from "../standing";
import { asFirmId } from "../tenant";
import { openSealed } from "./submission-making";
import { rasteriseOnce } from "../drawing-cache";
import { readAll, storage } from "@/lib/server/storage/storage";
import { buildBundle } from "@/templates/bundle";

type Pack = NonNullable<Awaited<ReturnType<typeof loadPack>>>;

async function loadPack(tx: Tx, firmId: string, packId: string) {
  const [pack] = await tx
    .select({
      id: packs.id,
      jobId: packs.jobId,
      jobNumber: jobs.number,
      version: packs.version,
      status: packs.status,
      record: packs.record,
      assessment: packs.assessment,
      photos: packs.photos,
      changes: packs.changes,
      gapsReason: packs.gapsReason,
      issuedAt: packs.issuedAt,
      chainHead: packs.chainHead,
      sealedBy: packs.sealedBy,
      sealedByName: users.name,
    })
    .from(packs)
    .innerJoin(jobs, and(eq(jobs.firmId, packs.firmId), eq(jobs.id, packs.jobId)))
    .innerJoin(users, eq(users.id, packs.sealedBy))
    .where(and(eq(packs.firmId, firmId), eq(packs.id, packId)));
  return pack ?? null;
}

/** Progress is for the person who waits: written at most every tenth, apart from the build itself. */
function progressWriter(firmId: string, packId: string) {
  let written = -10;
  let last: Promise<unknown> = Promise.resolve();
  return {
    note(percent: number, step: string) {
      const progress = Math.max(0, Math.min(99, Math.round(percent)));
      if (progress - written < 10) return;
      written = progress;
      last = last.then(() =>
        asFirmId(firmId, (tx) =>
          tx
            .update(packs)
            .set({ progress, step })
            .where(and(eq(packs.firmId, firmId), eq(packs.id, packId), eq(packs.status, "building"))),
        ),
      );
    },
    settled: () => last,
  };
}

async function build(firmId: string, pack: Pack) {
  const files = storage();
  const keyOf = new Map(pack.photos.map(({ file, storageKey }) => [file, storageKey]));
  const progress = progressWriter(firmId, pack.id);
  const bundle = await buildBundle({
    job: pack.record,
    assessment: pack.assessment,
    issue: {
      version: pack.version,
      issuedAt: pack.issuedAt,
      sealedBy: pack.sealedByName,
      gapsReason: pack.gapsReason,
      photos: pack.photos.map(({ storageKey: _key, ...photo }) => photo),
      changes: pack.changes,
    },
    photoBytes: async (file) => {
      const key = keyOf.get(file);
      const bytes = key ? await readAll(files, key) : null;
      if (key && !bytes) throw new Error(`photo ${file} of pack ${pack.id} is not in storage`);
      return bytes;
    },
    rasterise: rasteriseOnce,
    chainHead: pack.chainHead,
    onProgress: ({ done, total, step }) => progress.note((100 * done) / total, step),
  });
  await progress.settled();
  const storageKey = `packs/${bundle.sha256}.zip`;
  await files.put(storageKey, bundle.zip);
  return { ...bundle, storageKey };
}

/**
 * Builds the zip of a frozen pack, stores it by its hash and seals the row. Done again it gives the same bytes and
 * changes nothing, so the queue may try as often as it likes. One transaction seals the pack, makes its papers
 * ready and opens its review. Throws when a photo is gone or a document cannot be made; the queue tries again.
 */
export async function buildPack(packId: string, firmId: string): Promise<void> {
  const pack = await asFirmId(firmId, (tx) => loadPack(tx, firmId, packId));
  if (!pack) throw new Error(`pack ${packId} is not there`);
  if (pack.status === "sealed") return;
  const built = await build(firmId, pack);
  await asFirmId(firmId, async (tx) => {
    await tx
      .select({ id: jobs.id })
      .from(jobs)
      .where(and(eq(jobs.firmId, firmId), eq(jobs.id, pack.jobId)))
      .for("update");
    const sealed = await tx
      .update(packs)
      .set({
        status: "sealed",
        progress: 100,
        step: "Sealed",
        sha256: built.sha256,
        bytes: built.zip.byteLength,
        storageKey: built.storageKey,
        files: built.manifest.files.map(({ name, bytes, sha256 }) => ({ name, bytes, sha256 })),
        sealedAt: nowInstant(),
        error: null,
      })
      .where(and(eq(packs.firmId, firmId), eq(packs.id, packId), ne(packs.status, "sealed")))
      .returning({ id: packs.id });
    if (sealed.length === 0) return; // another worker was first, with the same bytes
    const actor = { firmId, userId: pack.sealedBy, name: pack.sealedByName };
    const about = { version: 1, jobId: pack.jobId, jobNumber: pack.jobNumber, packId } as const;
    await openSealed(tx, actor, {
      id: packId,
      version: pack.version,
      job: { id: pack.jobId, number: pack.jobNumber },
      record: pack.record,
      assessment: pack.assessment,
    });
    await refreshStanding(tx, firmId, pack.jobId);
    await recordEvent(tx, actor, { type: "pack.sealed", ...about, packVersion: pack.version, sha256: built.sha256 });
  });
}

/** The queue has given up on a pack: say so to the person who waits. `logId` is where the cause is logged. */
export async function failPack(packId: string, firmId: string, logId: string): Promise<void> {
  await asFirmId(firmId, async (tx) => {
    const pack = await loadPack(tx, firmId, packId);
    if (!pack || pack.status !== "building") return;
    const error = `The pack could not be built. Nothing was lost: seal again, and quote ${logId} if it fails once more.`;
    await tx
      .update(packs)
      .set({ status: "failed", step: "Could not be built", error })
      .where(and(eq(packs.firmId, firmId), eq(packs.id, packId), eq(packs.status, "building")));
    await refreshStanding(tx, firmId, pack.jobId);
    const about = { version: 1, jobId: pack.jobId, jobNumber: pack.jobNumber, packId } as const;
    const actor = { firmId, userId: null, name: "Sealwire" };
    await recordEvent(tx, actor, { type: "pack.failed", ...about, packVersion: pack.version, logId });
  });
}
