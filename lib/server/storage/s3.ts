import { Readable } from "node:stream";
import type { ReadableStream as NodeWebStream } from "node:stream/web";
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from "@aws-sdk/client-s3";
import { storageKey } from "./key";
import type { Storage } from "./storage";

export type S3Settings = {
  S3_BUCKET?: string | undefined;
  S3_REGION?: string | undefined;
  S3_ENDPOINT?: string | undefined;
  S3_ACCESS_KEY_ID?: string | undefined;
  S3_SECRET_ACCESS_KEY?: string | undefined;
};

const absent = (error: unknown): null => {
  if (error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404) return null;
  throw error;
};

/**
 * Files in an S3-compatible store. With no key settings the SDK's own chain is used (instance roles).
 * A call waits at most `timeoutMs` for an answer and is tried three times.
 */
export function s3Storage(settings: S3Settings, timeoutMs = 30_000): Storage {
  const { S3_BUCKET: Bucket, S3_REGION, S3_ENDPOINT, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY } = settings;
  const client = new S3Client({
    region: S3_REGION,
    endpoint: S3_ENDPOINT,
    forcePathStyle: Boolean(S3_ENDPOINT),
    maxAttempts: 3,
    requestHandler: { connectionTimeout: 5_000, requestTimeout: timeoutMs, throwOnRequestTimeout: true },
    // The default checksum is sent as a trailer, which some stores write into the object.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
    ...(S3_ACCESS_KEY_ID && S3_SECRET_ACCESS_KEY
      ? { credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY } }
      : {}),
  });
  const at = (key: string) => ({ Bucket, Key: storageKey(key) });
  return {
    async put(key, content) {
      const inHand = content instanceof Uint8Array;
      const bytes = inHand ? content.byteLength : content.bytes;
      const Body = inHand ? content : Readable.fromWeb(content.stream as NodeWebStream<Uint8Array>);
      await client.send(new PutObjectCommand({ ...at(key), Body, ContentLength: bytes }));
      return { bytes };
    },
    async get(key) {
      const found = await client.send(new GetObjectCommand(at(key))).catch(absent);
      if (!found?.Body || found.ContentLength === undefined) return null;
      return { stream: found.Body.transformToWebStream(), bytes: found.ContentLength };
    },
    async stat(key) {
      const found = await client.send(new HeadObjectCommand(at(key))).catch(absent);
      return found?.ContentLength === undefined ? null : { bytes: found.ContentLength };
    },
    async delete(key) {
      await client.send(new DeleteObjectCommand(at(key)));
    },
  };
}
