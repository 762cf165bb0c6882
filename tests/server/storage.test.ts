import { createHash, randomBytes } from "node:crypto";
import { mkdtempSync, readdirSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { fakeS3 } from "../support/fake-s3";
import { localStorage } from "@/lib/server/storage/local";
import { s3Storage } from "@/lib/server/storage/s3";
import { readAll, type Storage } from "@/lib/server/storage/storage";

const folder = mkdtempSync(join(tmpdir(), "sealwire-storage-"));
let fake: Awaited<ReturnType<typeof fakeS3>>;
const s3 = (timeoutMs?: number) =>
  s3Storage(
    {
      S3_BUCKET: "papers",
      S3_REGION: "eu-west-2",
      S3_ENDPOINT: fake.endpoint,
      S3_ACCESS_KEY_ID: "k",
      S3_SECRET_ACCESS_KEY: "s",
    },
    timeoutMs,
  );

beforeAll(async () => {
  fake = await fakeS3();
});
afterAll(async () => {
  await fake.close();
  rmSync(folder, { recursive: true, force: true });
});

const drivers: [string, () => Storage][] = [
  ["local folder", () => localStorage(folder)],
  ["S3", () => s3()],
];
const hash = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");
const streamed = (bytes: Uint8Array, pieces: number) =>
  new ReadableStream<Uint8Array>({
    start(controller) {
      const size = Math.ceil(bytes.length / pieces);
      for (let at = 0; at < bytes.length; at += size) controller.enqueue(bytes.slice(at, at + size));
      controller.close();
    },
  });

describe.each(drivers)("storage contract: %s", (_, make) => {
  it("gives back what was put, from bytes and from a stream of 2,000,000", async () => {
    const store = make();
    const bytes = randomBytes(2_000_000);
    expect(await store.put("packs/ab/one.zip", bytes)).toEqual({ bytes: 2_000_000 });
    expect(await store.put("packs/ab/two.zip", { stream: streamed(bytes, 7), bytes: bytes.length })).toEqual({
      bytes: 2_000_000,
    });
    for (const key of ["packs/ab/one.zip", "packs/ab/two.zip"]) {
      expect(await store.stat(key)).toEqual({ bytes: 2_000_000 });
      expect(hash((await readAll(store, key)) ?? new Uint8Array())).toBe(hash(bytes));
    }
  });

  it("says null for what is not there, and deletes without complaint", async () => {
    const store = make();
    expect(await store.get("photos/none.jpg")).toBeNull();
    expect(await store.stat("photos/none.jpg")).toBeNull();
    await store.delete("photos/none.jpg");
    await store.put("photos/x.jpg", new Uint8Array([1]));
    await store.delete("photos/x.jpg");
    expect(await store.stat("photos/x.jpg")).toBeNull();
  });

  it("replaces, and keeps an empty file", async () => {
    const store = make();
    await store.put("a/b", new Uint8Array([1, 2, 3]));
    await store.put("a/b", new Uint8Array());
    expect(await store.stat("a/b")).toEqual({ bytes: 0 });
  });

  it.each(["../x", "a/../b", "/etc/passwd", "a//b", ".hidden", "a/.b", "a b", "", "x".repeat(201), "a\0b"])(
    "refuses the key %j",
    async (key) => {
      await expect(make().put(key, new Uint8Array([1]))).rejects.toThrow("not a storage key");
    },
  );
});

describe("local folder", () => {
  it("leaves nothing behind when a stream breaks or ends early", async () => {
    const store = localStorage(folder);
    const broken = new ReadableStream<Uint8Array>({
      pull(controller) {
        controller.error(new Error("the phone lost its signal"));
      },
    });
    await expect(store.put("half/one", { stream: broken, bytes: 9 })).rejects.toThrow("signal");
    await expect(store.put("half/two", { stream: streamed(new Uint8Array(4), 1), bytes: 9 })).rejects.toThrow(
      "ended early",
    );
    expect(readdirSync(join(folder, "half"))).toEqual([]);
  });
});

describe("S3 that misbehaves", () => {
  it.each(["fails", "rubbish"] as const)("%s: the call is tried again, then throws", async (mode) => {
    fake.state.mode = mode;
    const before = fake.state.calls;
    await expect(s3().stat("a/b")).rejects.toThrow();
    expect(fake.state.calls - before).toBe(3);
    fake.state.mode = "right";
  });

  it("hangs: the call gives up", async () => {
    fake.state.mode = "hangs";
    await expect(s3(150).stat("a/b")).rejects.toThrow();
    fake.state.mode = "right";
  });
});
