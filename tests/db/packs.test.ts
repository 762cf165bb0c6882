import { createHash, randomUUID } from "node:crypto";
import JSZip from "jszip";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import { codeOf, colleague, connected, exampleRecord, openJob, seal, sealAndBuild, soleTrader, value } from "./fixture";
import { assessJob } from "@/db/queries/assessments";
import { getJob, saveJob } from "@/db/queries/jobs";
import { buildPack, failPack } from "@/db/queries/pack-build";
import { getPack, listPacks, openPack, sealPack } from "@/db/queries/packs";
import { addPhoto, openPhoto, removePhoto, setPhoto } from "@/db/queries/photos";
import { reviewOfJob } from "@/db/queries/reviews";
import { submissionsOfJob } from "@/db/queries/submissions";
import type { Viewer } from "@/lib/server/auth/viewer";

let viewer: Viewer;
beforeAll(async () => {
  viewer = await soleTrader();
});

const bytesOf = async (packId: string) => {
  const { stream, bytes } = value(await openPack(viewer, { packId }));
  const zip = new Uint8Array(await new Response(stream).arrayBuffer());
  expect(zip.byteLength).toBe(bytes);
  return zip;
};
const sha256 = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");
const picture = (shade: number) =>
  sharp({ create: { width: 40, height: 30, channels: 3, background: { r: shade, g: 90, b: 60 } } })
    .jpeg()
    .toBuffer()
    .then((bytes) => new Uint8Array(bytes));

describe("sealing", () => {
  it("freezes, builds, stores by hash, makes the notice ready and opens the review", async () => {
    const jobId = await openJob(viewer);
    const packId = await sealAndBuild(viewer, jobId);
    const pack = value(await getPack(viewer, { packId }));
    expect(pack).toMatchObject({ status: "sealed", version: 1, progress: 100, sealedBy: viewer.name });
    expect(sha256(await bytesOf(packId))).toBe(pack.sha256);
    expect(pack.files.map(({ name }) => name)).toContain("data/job.json");
    const papers = value(await submissionsOfJob(viewer, { jobId }));
    expect(papers).toMatchObject([{ purpose: "demand-notice", state: "draft", dueOn: "2026-12-18", packId }]);
    expect(value(await reviewOfJob(viewer, { jobId }))).toMatchObject({ state: "waiting", packId });
    const { thread } = value(await getJob(viewer, { jobId }));
    expect(thread.map(({ standing }) => standing)).toEqual(["passed", "passed", "passed", "now", "now"]);
  });

  it("holds the record and the assessment word for word as they were frozen", async () => {
    const packId = await sealAndBuild(viewer, await openJob(viewer));
    const zip = await JSZip.loadAsync(await bytesOf(packId));
    const { rows } = await connected("admin", (client) =>
      client.query<Record<string, string>>("select record::text as job, assessment::text from packs where id = $1", [
        packId,
      ]),
    );
    for (const name of ["job", "assessment"]) {
      const frozen: unknown = JSON.parse(rows[0]?.[name] ?? "");
      expect(await zip.file(`data/${name}.json`)?.async("string"), name).toBe(`${JSON.stringify(frozen, null, 2)}\n`);
    }
  });

  it("built again gives the same bytes and changes nothing", async () => {
    const jobId = await openJob(viewer);
    const { packId } = value(await seal(viewer, jobId));
    await Promise.all([buildPack(packId, viewer.firmId), buildPack(packId, viewer.firmId)]);
    const sealed = value(await getPack(viewer, { packId }));
    await buildPack(packId, viewer.firmId);
    expect(value(await getPack(viewer, { packId }))).toEqual(sealed);
    expect(value(await submissionsOfJob(viewer, { jobId }))).toHaveLength(1);
  });

  it("sealed twice at once with one id makes one pack, with two ids makes one and tells the other", async () => {
    const jobId = await openJob(viewer);
    const { version } = value(await getJob(viewer, { jobId }));
    const input = { jobId, expectedVersion: version, gapsReason: null };
    const declaration = { name: viewer.name, statement: "Seen." };
    const [one, other] = [randomUUID(), randomUUID()];
    const results = await Promise.all(
      [one, one, other].map((packId) => sealPack(viewer, { ...input, packId, declaration })),
    );
    expect(value(await listPacks(viewer, { jobId }))).toHaveLength(1);
    expect(results.map(codeOf).filter((code) => code === "ok").length).toBeGreaterThanOrEqual(1);
  });

  it("is refused when the job moved on, by who may not declare, and with gaps but no reason", async () => {
    const jobId = await openJob(
      viewer,
      exampleRecord((record) => Object.assign(record.customer, { phone: null })),
    );
    const declaration = { name: viewer.name, statement: "Seen." };
    const stale = { jobId, packId: randomUUID(), expectedVersion: 7, declaration, gapsReason: null };
    expect(codeOf(await sealPack(viewer, stale))).toBe("conflict");
    const office = await colleague(viewer, ["admin"]);
    expect(codeOf(await seal(office, jobId))).toBe("not-competent");
    expect(await seal(viewer, jobId)).toMatchObject({
      ok: false,
      error: { code: "gaps", fields: [{ path: "customer.phone" }] },
    });
    const packId = await sealAndBuild(viewer, jobId, "The customer has no telephone.");
    expect(value(await getPack(viewer, { packId })).gapsReason).toBe("The customer has no telephone.");
  });

  it("says what a version changed, and that the one before is superseded", async () => {
    const jobId = await openJob(viewer);
    const first = await sealAndBuild(viewer, jobId);
    const { version } = value(await getJob(viewer, { jobId }));
    const changes = [{ path: "circuits[0].cable.lengthM", was: 18, value: 22 }];
    value(await saveJob(viewer, { jobId, saveId: randomUUID(), baseVersion: version, changes }));
    const second = await sealAndBuild(viewer, jobId);
    expect(value(await getPack(viewer, { packId: second })).changes).toEqual([
      { path: "circuits[0].cable.lengthM", was: 18, now: 22 },
    ]);
    expect(value(await getPack(viewer, { packId: first })).supersededBy).toBe(2);
    expect(value(await submissionsOfJob(viewer, { jobId }))).toMatchObject([{ packId: second, packVersion: 2 }]);
    expect(value(await reviewOfJob(viewer, { jobId }))).toMatchObject({ packId: second, state: "waiting" });
  });

  it("of a stopped job makes the safety report ready and nothing else", async () => {
    const record = exampleRecord((draft) => {
      draft.supply.serviceConditions = ["heat-marks"];
    });
    const jobId = await openJob(viewer, record);
    await sealAndBuild(viewer, jobId);
    const papers = value(await submissionsOfJob(viewer, { jobId }));
    expect(papers.map(({ purpose }) => purpose)).toEqual(["safety-report"]);
  });

  it("tells the person who waits when the queue has given up, and lets them seal again", async () => {
    const jobId = await openJob(viewer);
    const { packId } = value(await seal(viewer, jobId));
    await failPack(packId, viewer.firmId, "a1b2");
    expect(value(await getPack(viewer, { packId }))).toMatchObject({ status: "failed", error: /a1b2/ });
    expect(value(await seal(viewer, jobId))).toMatchObject({ version: 2 });
  });
});

describe("a sealed pack", () => {
  it.each(["owner", "admin"] as const)("is changed by nobody, not by the %s", async (as) => {
    const packId = await sealAndBuild(viewer, await openJob(viewer));
    await connected(as, async (client) => {
      await client.query("begin");
      await client.query("select set_config('app.firm_id', $1, true)", [viewer.firmId]);
      for (const change of ["update packs set step = 'x'", "update packs set sha256 = 'x'", "delete from packs"]) {
        await client.query("savepoint before_change");
        await expect(client.query(`${change} where id = $1`, [packId])).rejects.toMatchObject({ code: "42501" });
        await client.query("rollback to before_change");
      }
    });
  });

  it("is frozen from its first moment, while it is still being built", async () => {
    const { packId } = value(await seal(viewer, await openJob(viewer)));
    await connected("app", async (client) => {
      await client.query("begin");
      await client.query("select set_config('app.firm_id', $1, true)", [viewer.firmId]);
      const change = client.query(`update packs set record = '{}' where id = $1`, [packId]);
      await expect(change).rejects.toMatchObject({ code: "42501" });
    });
  });
});

describe("photos", () => {
  const add = async (jobId: string, shade: number, photoId: string = randomUUID()) =>
    addPhoto(viewer, { jobId, photoId, subject: "cut-out", of: null, caption: null, bytes: await picture(shade) });

  it("are stored once a client's id, stand in the record, and go into the pack", async () => {
    const jobId = await openJob(viewer);
    const photoId = randomUUID();
    const [one, again] = [value(await add(jobId, 10, photoId)), value(await add(jobId, 10, photoId))];
    expect(again).toEqual(one);
    expect(codeOf(await add(jobId, 200, photoId))).toBe("key-reused");
    const { record, photos } = value(await getJob(viewer, { jobId }));
    expect(photos).toHaveLength(1);
    expect(record.evidence).toMatchObject([{ subject: "cut-out", file: one.file }]);
    const packId = await sealAndBuild(viewer, jobId);
    const { files } = value(await getPack(viewer, { packId }));
    expect(files.filter(({ name }) => name.startsWith("photos/"))).toHaveLength(1);
  });

  it("that are not ticked stay out of the pack; taken out of the job they can still be opened", async () => {
    const jobId = await openJob(viewer);
    const { id: photoId } = value(await add(jobId, 30));
    value(await setPhoto(viewer, { photoId, caption: "Carrier label", subject: "cut-out", inPack: false }));
    expect(value(await getJob(viewer, { jobId })).record.evidence).toMatchObject([{ caption: "Carrier label" }]);
    const { files } = value(await getPack(viewer, { packId: await sealAndBuild(viewer, jobId) }));
    expect(files.some(({ name }) => name.startsWith("photos/"))).toBe(false);
    value(await removePhoto(viewer, { photoId }));
    expect(value(await getJob(viewer, { jobId }))).toMatchObject({ photos: [], record: { evidence: [] } });
    expect(value(await openPhoto(viewer, { photoId })).bytes).toBeGreaterThan(0);
  });
});

describe("assessments", () => {
  it("are appended when they say something new and used again when they do not", async () => {
    const jobId = await openJob(viewer);
    const first = value(await assessJob(viewer, { jobId }));
    expect(value(await assessJob(viewer, { jobId })).id).toBe(first.id);
    const changes = [{ path: "demand.existingA", was: [24.8], value: [40] }];
    value(await saveJob(viewer, { jobId, saveId: randomUUID(), baseVersion: 1, changes }));
    const second = value(await assessJob(viewer, { jobId }));
    expect([first.body.route.demand, second.body.route.demand]).toEqual(["notify", "late-application"]);
    expect(second.jobVersion).toBe(2);
  });

  it("of a record that contradicts itself name the fields", async () => {
    const jobId = await openJob(
      viewer,
      exampleRecord((record) => Object.assign(record.dates, { commissioned: "2026-11-01" })),
    );
    expect(await assessJob(viewer, { jobId })).toMatchObject({
      ok: false,
      error: { code: "contradictory", fields: [{ path: "dates.commissioned" }] },
    });
  });
});
