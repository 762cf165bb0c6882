import { randomUUID } from "node:crypto";
import { createReadStream } from "node:fs";
import { mkdir, open, rename, rm, stat } from "node:fs/promises";
import { dirname, join } from "node:path";
import { Readable } from "node:stream";
import { storageKey } from "./key";
import type { Content, Storage } from "./storage";

const missing = (error: unknown): boolean =>
  error instanceof Error && "code" in error && (error.code === "ENOENT" || error.code === "ENOTDIR");

async function* chunksOf(content: Content): AsyncIterable<Uint8Array> {
  if (content instanceof Uint8Array) yield content;
  else yield* content.stream as unknown as AsyncIterable<Uint8Array>;
}

/** Write to a new file and wait for the disk. Returns the number of bytes. */
async function writeDurably(path: string, content: Content): Promise<number> {
  const file = await open(path, "wx", 0o640);
  try {
    let bytes = 0;
    for await (const chunk of chunksOf(content)) {
      await file.writeFile(chunk);
      bytes += chunk.byteLength;
    }
    await file.sync();
    return bytes;
  } finally {
    await file.close();
  }
}

/** A rename is durable once its folder is. */
async function syncFolder(path: string): Promise<void> {
  const folder = await open(path, "r");
  try {
    await folder.sync();
  } finally {
    await folder.close();
  }
}

/** Files in a folder of this machine: written beside their place, synced, then moved into it in one step. */
export function localStorage(root: string): Storage {
  const pathOf = (key: string) => join(root, storageKey(key));
  const statOf = async (key: string) => {
    const found = await stat(pathOf(key)).catch((error: unknown) => {
      if (missing(error)) return null;
      throw error;
    });
    return found?.isFile() ? { bytes: found.size } : null;
  };
  return {
    async put(key, content) {
      const path = pathOf(key);
      const folder = dirname(path);
      await mkdir(folder, { recursive: true });
      const beside = join(folder, `.${randomUUID()}.part`);
      try {
        const bytes = await writeDurably(beside, content);
        if (!(content instanceof Uint8Array) && bytes !== content.bytes) throw new Error("the stream ended early");
        await rename(beside, path);
        await syncFolder(folder);
        return { bytes };
      } catch (error) {
        await rm(beside, { force: true });
        throw error;
      }
    },
    async get(key) {
      const found = await statOf(key);
      if (!found) return null;
      const stream = Readable.toWeb(createReadStream(pathOf(key))) as unknown as ReadableStream<Uint8Array>;
      return { stream, ...found };
    },
    stat: statOf,
    async delete(key) {
      await rm(pathOf(key), { force: true });
    },
  };
}
