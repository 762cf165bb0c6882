import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import JSZip from "jszip";
import sharp from "sharp";
import { beforeAll, describe, expect, it } from "vitest";
import { parseJob } from "@/lib/notify/job";
import { rasterise } from "@/lib/server/rasterise";
import { buildBundle, type Bundle, type Progress } from "@/templates/bundle";
import { csv } from "@/templates/csv";
import { photoKind, withoutMetadata } from "@/templates/photo-bytes";
import { sha256 } from "@/templates/sha256";
import { example, samples, type Sample } from "./generated-jobs";

/** A small picture that says where it was taken, and which way up it was held. */
async function photo(kind: "jpeg" | "png" | "webp", orientation = 6): Promise<Uint8Array> {
  const exif = { IFD0: { Copyright: "SOMEBODY" }, IFD3: { GPSLatitude: "51/1 30/1 0/1", GPSLatitudeRef: "N" } };
  const picture = sharp({ create: { width: 40, height: 24, channels: 3, background: "#a8501f" } });
  return new Uint8Array(await picture.withExif(exif).withMetadata({ orientation, exif }).toFormat(kind).toBuffer());
}

const bundleOf = async (
  { job, assessment, issue }: Sample,
  onProgress?: (progress: Progress) => void,
): Promise<Bundle> => {
  const bytes = await photo("jpeg");
  return buildBundle({
    job,
    assessment,
    issue,
    photoBytes: async (file) => (file === "head.jpg" ? null : bytes),
    rasterise,
    onProgress,
  });
};

const notice = example("fen-0147-notice");

describe("the bundle of the worked example", () => {
  let bundle: Bundle;
  let zip: JSZip;
  const progress: Progress[] = [];
  const text = async (name: string) => (await zip.file(name)?.async("string")) ?? expect.unreachable();
  beforeAll(async () => {
    bundle = await bundleOf(notice, (step) => progress.push(step));
    zip = await JSZip.loadAsync(bundle.zip);
  });

  it("holds what the design names, in reading order, under names that no system trips over", () => {
    const names = Object.keys(zip.files);
    expect(names).toEqual([
      "00-cover.docx",
      "01-network-notification.docx",
      "02-earthing-and-open-pen.docx",
      "03-smart-charging-settings.docx",
      "04-demand-and-circuit.docx",
      "05-handover.docx",
      "drawings/single-line.svg",
      "drawings/week-cp1.svg",
      "drawings/demand.svg",
      "data/job.json",
      "data/assessment.json",
      "data/notification.csv",
      "photos/FEN-0147-01-cut-out.jpg",
      "README.txt",
      "MANIFEST.json",
      "SHA256SUMS",
    ]);
    for (const name of names) expect(name).toMatch(/^[A-Za-z0-9][A-Za-z0-9._/-]{0,99}$/);
  });

  it("is checked by sha256sum, as anybody would", () => {
    const folder = mkdtempSync(join(tmpdir(), "pack-"));
    writeFileSync(join(folder, "p.zip"), bundle.zip);
    execFileSync("unzip", ["-q", "p.zip"], { cwd: folder });
    const said = execFileSync("sha256sum", ["-c", "--strict", "SHA256SUMS"], { cwd: folder, encoding: "utf8" });
    expect(said.trim().split("\n")).toHaveLength(15);
    writeFileSync(join(folder, "data/job.json"), "{}");
    expect(() => execFileSync("sha256sum", ["-c", "--quiet", "SHA256SUMS"], { cwd: folder, stdio: "pipe" })).toThrow();
  });

  it("has a manifest with the size and hash of every file, and the pack's own fingerprint", async () => {
    const manifest = JSON.parse(await text("MANIFEST.json")) as Bundle["manifest"];
    expect(manifest).toEqual(bundle.manifest);
    expect(manifest).toMatchObject({
      format: "sealwire.pack/1",
      jobNumber: "FEN-0147",
      version: 1,
      sealedBy: "Tam Orrell",
      route: "notify",
    });
    for (const { name, bytes, sha256: hash } of manifest.files) {
      const data = (await zip.file(name)?.async("uint8array")) ?? expect.unreachable();
      expect([data.length, await sha256(data)]).toEqual([bytes, hash]);
    }
    expect(await sha256(await text("MANIFEST.json"))).toBe(bundle.manifestSha256);
    expect(await sha256(bundle.zip)).toBe(bundle.sha256);
  });

  it("holds the record so that it reads back the same", async () => {
    const read = parseJob(JSON.parse(await text("data/job.json")));
    expect(read).toMatchObject({ ok: true, value: notice.job, unread: [] });
    expect(JSON.parse(await text("data/assessment.json"))).toEqual(JSON.parse(JSON.stringify(notice.assessment)));
  });

  it("names a photo it does not hold on the cover's list, in the README and in its answer", async () => {
    expect(bundle.leftOut).toEqual(["head.jpg"]);
    expect(await text("README.txt")).toContain("Photos named in the record and not in this pack\r\n  head.jpg");
  });

  it("stores photos and documents, deflates text, and bears no time", async () => {
    for (const [name, file] of Object.entries(zip.files)) {
      expect(file.date.toISOString()).toBe("1980-01-01T00:00:00.000Z");
      const { compression } = (file as unknown as { _data: { compression: { magic: string } } })._data;
      expect(compression.magic, name).toBe(/\.(docx|jpg)$/.test(name) ? "\x00\x00" : "\x08\x00");
    }
  });

  it("tells how far it is, from nothing to done", () => {
    expect(progress[0]).toMatchObject({ done: 0, step: "Writing Cover and index" });
    expect(progress.at(-1)).toMatchObject({ done: 8, total: 8 });
  });

  it("is the same, byte for byte, when it is built again", async () => {
    expect((await bundleOf(notice)).sha256).toBe(bundle.sha256);
  });
});

it("a stopped job carries its report and no rows that could be taken for a notice", async () => {
  const names = Object.keys((await JSZip.loadAsync((await bundleOf(example("fen-0153-stop"))).zip)).files);
  expect(names.filter((name) => name.endsWith(".docx"))).toEqual(["00-cover.docx", "01-network-notification.docx"]);
  expect(names).not.toContain("data/notification.csv");
  expect(names.some((name) => name.startsWith("drawings/"))).toBe(false);
});

it("generated records pack under proper names, each once", async () => {
  for (const sample of samples(4, 11)) {
    const names = Object.keys((await JSZip.loadAsync((await bundleOf(sample)).zip)).files);
    expect(new Set(names.map((name) => name.toLowerCase())).size).toBe(names.length);
    for (const name of names) expect(name).toMatch(/^[A-Za-z0-9][A-Za-z0-9._/-]{0,99}$/);
  }
}, 60_000);

describe("photos", () => {
  it.each(["jpeg", "png", "webp"] as const)("lose place and owner, keep the picture: %s", async (kind) => {
    const before = await photo(kind);
    expect(Buffer.from(before).includes("SOMEBODY")).toBe(true);
    const clean = withoutMetadata(before) ?? expect.unreachable();
    const after = await sharp(clean.bytes).metadata();
    expect(Buffer.from(clean.bytes).includes("SOMEBODY")).toBe(false);
    expect(await sharp(clean.bytes).raw().toBuffer()).toEqual(await sharp(before).raw().toBuffer());
    expect([after.width, after.height]).toEqual([40, 24]);
    expect(withoutMetadata(clean.bytes)?.bytes).toEqual(clean.bytes);
  });

  it.each([1, 3, 6, 8])("are kept the right way up: %i", async (orientation) => {
    const clean = withoutMetadata(await photo("jpeg", orientation)) ?? expect.unreachable();
    expect((await sharp(clean.bytes).metadata()).orientation ?? 1).toBe(orientation);
  });

  it("that break off, or are no picture, are left out", async () => {
    const whole = await photo("jpeg");
    expect(withoutMetadata(whole.subarray(0, 30))).toBeNull();
    expect(withoutMetadata(new TextEncoder().encode("<svg onload=alert(1)>"))).toBeNull();
    expect(photoKind(new Uint8Array())).toBeNull();
  });
});

/** OWASP, CSV injection: a cell that begins with one of = + - @ tab or return is run by a spreadsheet. */
it.each(["=1+1", "+1", "-1", "@SUM(1)", "\tx", "\rx"])("a cell %j stays text in a spreadsheet", (cell) => {
  expect(
    csv([[cell]])
      .slice(1)
      .replace(/^"/, "")[0],
  ).toBe("'");
});

it("rows are parted and quoted after RFC 4180", () => {
  expect(
    csv([
      ["a", 'b "c", d'],
      ["e\nf", ""],
    ]),
  ).toBe('\uFEFFa,"b ""c"", d"\r\n"e\nf",\r\n');
});

describe("the pack command", () => {
  const folder = mkdtempSync(join(tmpdir(), "pack-command-"));
  const run = (args: string[], env: Record<string, string> = {}) =>
    execFileSync("node", ["--import", "tsx", "scripts/pack.ts", ...args], {
      env: { ...process.env, ...env },
      encoding: "utf8",
      stdio: "pipe",
    });
  const failure = (args: string[]) => {
    try {
      run(args);
    } catch (error) {
      return error as { status: number; stderr: string };
    }
    return expect.unreachable();
  };
  const record = "tests/examples/fen-0147-notice.json";

  it("writes the same bytes under other clocks and time zones, with the photos of a folder", async () => {
    writeFileSync(join(folder, "cut-out.jpg"), await photo("jpeg"));
    const pack = (out: string, TZ: string) => {
      run([record, "--out", join(folder, out), "--issued-at", "2026-12-01T09:00:00Z", "--photos", folder], { TZ });
      return sha256(new Uint8Array(readFileSync(join(folder, out))));
    };
    expect(await pack("a.zip", "Pacific/Auckland")).toBe(await pack("b.zip", "America/Los_Angeles"));
    const names = Object.keys((await JSZip.loadAsync(readFileSync(join(folder, "a.zip")))).files);
    expect(names).toContain("photos/FEN-0147-01-cut-out.jpg");
  }, 60_000);

  it("ends with 2 and a line a field when the record does not parse", () => {
    writeFileSync(
      join(folder, "bad.json"),
      JSON.stringify({ ...notice.job, stage: "done", supply: { cutOutRatingA: "100" } }),
    );
    const { status, stderr } = failure([
      join(folder, "bad.json"),
      "--out",
      join(folder, "x.zip"),
      "--issued-at",
      "2026-12-01T09:00:00Z",
    ]);
    expect(status).toBe(2);
    const lines = stderr.trim().split("\n");
    expect(lines).toHaveLength(2);
    expect(lines[0]).toMatch(/^stage: choose one of/);
    expect(lines[1]).toMatch(/^supply\.cutOutRatingA: /);
  }, 30_000);

  it("ends with 2 and names an option that is missing or malformed", () => {
    const { status, stderr } = failure([record, "--issued-at", "yesterday"]);
    expect(status).toBe(2);
    expect(stderr).toContain("--out: name the zip to write");
    expect(stderr).toContain("--issued-at: write the time as");
  }, 30_000);
});
