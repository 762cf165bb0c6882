import { env } from "../env";
import { localStorage } from "./local";
import { s3Storage } from "./s3";

/** Bytes in hand, or a stream whose length is known. */
export type Content = Uint8Array | { stream: ReadableStream<Uint8Array>; bytes: number };

/**
 * Where files live. Keys are made by us and never by a person. A `put` that has returned is durable and whole;
 * one that failed leaves nothing under the key. Putting the same key again replaces it in one step.
 */
export type Storage = {
  put(key: string, content: Content): Promise<{ bytes: number }>;
  /** Null when there is nothing under the key. */
  get(key: string): Promise<{ stream: ReadableStream<Uint8Array>; bytes: number } | null>;
  stat(key: string): Promise<{ bytes: number } | null>;
  /** Deleting what is not there is not an error. */
  delete(key: string): Promise<void>;
};

let made: Storage | null = null;

/** The storage of this process, by STORAGE_DRIVER. */
export function storage(): Storage {
  const settings = env();
  return (made ??= settings.STORAGE_DRIVER === "s3" ? s3Storage(settings) : localStorage(settings.storageDir));
}

/** All the bytes under a key, or null. For photos and packs, which fit in memory. */
export async function readAll(from: Storage, key: string): Promise<Uint8Array | null> {
  const found = await from.get(key);
  return found ? new Uint8Array(await new Response(found.stream).arrayBuffer()) : null;
}
