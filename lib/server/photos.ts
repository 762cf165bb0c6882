import { createHash } from "node:crypto";
import sharp from "sharp";
import { exifTakenAt } from "./exif-time";
import { fileKind, type FileKind } from "./file-kind";
import { failed, ok, type Result } from "@/lib/notify/result";

export const photoLimits = { bytes: 15 * 1024 * 1024, pixels: 64_000_000, longestSidePx: 2048 } as const;

export type PreparedPhoto = {
  /** Always JPEG, turned upright, without any metadata. */
  bytes: Uint8Array;
  contentType: "image/jpeg";
  widthPx: number;
  heightPx: number;
  sha256: string;
  /** SHA-256 of the file as it was sent, to know the same upload again. */
  sentSha256: string;
  /** When it was taken, UTC, from the picture itself; null when it does not say. */
  takenAt: string | null;
};

// One photo at a time in a request, and no cache: memory is worth more here than a few milliseconds.
sharp.cache(false);

const refusals: Record<Exclude<FileKind, "jpeg" | "png" | "webp">, string> = {
  heic: "This is a HEIC photo, which cannot be read here. Set the camera to “Most compatible” (JPEG), or send a screenshot of it.",
  gif: "This is a GIF. Send a photo as JPEG, PNG or WebP.",
  pdf: "This is a PDF, not a photo, whatever its name says. Send a photo as JPEG, PNG or WebP.",
  markup: "This is a drawing or a web page (SVG or HTML), not a photo. Send a photo as JPEG, PNG or WebP.",
  empty: "This file is empty. The phone may not have finished saving it: try once more.",
  other: "This is not a photo that can be read here. Send a photo as JPEG, PNG or WebP.",
};

const refuse = (code: string, message: string) => failed(code, message, [{ path: "file", message }]);
const sha256 = (bytes: Uint8Array) => createHash("sha256").update(bytes).digest("hex");

function ofSharp(error: unknown): Result<never> {
  const text = error instanceof Error ? error.message : "";
  if (/pixel limit/i.test(text)) {
    return refuse(
      "too-large",
      "This photo has more than 64 megapixels. Take it at a smaller setting and send it again.",
    );
  }
  if (/timeout/i.test(text)) return refuse("unreadable", "This photo took too long to read. Send it as a plain JPEG.");
  return refuse(
    "unreadable",
    "This photo is damaged and cannot be read to its end. Take it again, or send another copy.",
  );
}

/**
 * Make an uploaded picture fit to keep: known by its bytes and not its name, drawn anew so that nothing else in
 * the file survives, turned upright, at most 2048 px on its longer side, place and all other metadata dropped.
 * Failures, each with the field `file`: `too-large` (15 MB, 64 megapixels), `unsupported` (HEIC, PDF, SVG, …),
 * `unreadable` (damaged).
 */
export async function preparePhoto(sent: Uint8Array): Promise<Result<PreparedPhoto>> {
  if (sent.byteLength > photoLimits.bytes) {
    const mb = (sent.byteLength / 1024 / 1024).toFixed(1);
    return refuse("too-large", `This photo is ${mb} MB and the limit is 15 MB. Take it at a smaller setting.`);
  }
  const kind = fileKind(sent);
  if (kind !== "jpeg" && kind !== "png" && kind !== "webp") return refuse("unsupported", refusals[kind]);
  try {
    const picture = sharp(sent, { limitInputPixels: photoLimits.pixels, failOn: "error" });
    const { exif } = await picture.metadata();
    const side = photoLimits.longestSidePx;
    const { data, info } = await picture
      .autoOrient()
      .resize({ width: side, height: side, fit: "inside", withoutEnlargement: true })
      .flatten({ background: "#ffffff" })
      .jpeg({ quality: 82, chromaSubsampling: "4:2:0" })
      .timeout({ seconds: 20 })
      .toBuffer({ resolveWithObject: true });
    return ok({
      bytes: new Uint8Array(data),
      contentType: "image/jpeg",
      widthPx: info.width,
      heightPx: info.height,
      sha256: sha256(data),
      sentSha256: sha256(sent),
      takenAt: exifTakenAt(exif),
    });
  } catch (error) {
    return ofSharp(error);
  }
}
