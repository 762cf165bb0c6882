/**
 * Pictures without what a camera adds to them: place, time, owner, thumbnails. The picture itself is not encoded
 * anew. Which way up it was held is kept, because without it the picture lies on its side.
 */
export type PhotoKind = "jpg" | "png" | "webp";

const begins = (bytes: Uint8Array, ...first: number[]) => first.every((byte, index) => bytes[index] === byte);
const ascii = (bytes: Uint8Array, from: number, length: number) =>
  String.fromCharCode(...bytes.subarray(from, from + length));

/** The kind of picture by its first bytes, whatever its name says; null when it is none of the three. */
export function photoKind(bytes: Uint8Array): PhotoKind | null {
  if (begins(bytes, 0xff, 0xd8, 0xff)) return "jpg";
  if (begins(bytes, 0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a)) return "png";
  return ascii(bytes, 0, 4) === "RIFF" && ascii(bytes, 8, 4) === "WEBP" ? "webp" : null;
}

/** The picture without its metadata. Null when it is not a JPEG, PNG or WebP, or breaks off before its end. */
export function withoutMetadata(bytes: Uint8Array): { kind: PhotoKind; bytes: Uint8Array } | null {
  const kind = photoKind(bytes);
  if (kind === null) return null;
  const clean = { jpg: cleanJpeg, png: cleanPng, webp: cleanWebp }[kind](bytes);
  return clean && { kind, bytes: clean };
}

function joined(parts: readonly Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    whole.set(part, at);
    at += part.length;
  }
  return whole;
}

const view = (bytes: Uint8Array) => new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

/** JFIF, colour profile and the Adobe colour transform stay; every other application segment and comment goes. */
const keptSegments = [0xe0, 0xe2, 0xee];

function cleanJpeg(bytes: Uint8Array): Uint8Array | null {
  const parts: Uint8Array[] = [bytes.subarray(0, 2)];
  let upright = 1;
  for (let at = 2; at + 4 <= bytes.length;) {
    if (bytes[at] !== 0xff) return null;
    const marker = bytes[at + 1] ?? 0;
    if (marker === 0xda) {
      if (upright !== 1) parts.splice(1, 0, orientationSegment(upright));
      return joined([...parts, bytes.subarray(at)]);
    }
    const end = at + 2 + view(bytes).getUint16(at + 2);
    if (end > bytes.length) return null;
    if (marker === 0xe1 && ascii(bytes, at + 4, 4) === "Exif") upright = orientationOf(bytes.subarray(at + 10, end));
    const application = (marker >= 0xe0 && marker <= 0xef) || marker === 0xfe;
    if (!application || keptSegments.includes(marker)) parts.push(bytes.subarray(at, end));
    at = end;
  }
  return null;
}

/** Tag 274 of the first directory: which way up, 1 to 8. 1 when there is none. */
function orientationOf(tiff: Uint8Array): number {
  if (tiff.length < 14) return 1;
  const data = view(tiff);
  const little = ascii(tiff, 0, 2) === "II";
  const directory = data.getUint32(4, little);
  if (directory + 2 > tiff.length) return 1;
  const count = data.getUint16(directory, little);
  for (let index = 0; index < count; index += 1) {
    const entry = directory + 2 + index * 12;
    if (entry + 12 > tiff.length) return 1;
    if (data.getUint16(entry, little) !== 274) continue;
    const value = data.getUint16(entry + 8, little);
    return value >= 1 && value <= 8 ? value : 1;
  }
  return 1;
}

/** The smallest Exif segment that says which way up. */
const orientationSegment = (value: number): Uint8Array =>
  Uint8Array.from([
    ...[0xff, 0xe1, 0x00, 0x22, 0x45, 0x78, 0x69, 0x66, 0x00, 0x00],
    ...[0x4d, 0x4d, 0x00, 0x2a, 0x00, 0x00, 0x00, 0x08, 0x00, 0x01],
    ...[0x01, 0x12, 0x00, 0x03, 0x00, 0x00, 0x00, 0x01, 0x00, value, 0x00, 0x00],
    ...[0x00, 0x00, 0x00, 0x00],
  ]);

const droppedChunks = ["eXIf", "tEXt", "zTXt", "iTXt", "tIME"];

function cleanPng(bytes: Uint8Array): Uint8Array | null {
  const parts = [bytes.subarray(0, 8)];
  for (let at = 8; at + 12 <= bytes.length;) {
    const end = at + 12 + view(bytes).getUint32(at);
    if (end > bytes.length) return null;
    const name = ascii(bytes, at + 4, 4);
    if (!droppedChunks.includes(name)) parts.push(bytes.subarray(at, end));
    if (name === "IEND") return joined(parts);
    at = end;
  }
  return null;
}

/** Bits of the extended header that announce Exif and XMP. */
const metadataFlags = 0x08 | 0x04;

function cleanWebp(bytes: Uint8Array): Uint8Array | null {
  const parts: Uint8Array[] = [];
  let at = 12;
  while (at + 8 <= bytes.length) {
    const size = view(bytes).getUint32(at + 4, true);
    const end = at + 8 + size + (size % 2);
    if (at + 8 + size > bytes.length) return null;
    const name = ascii(bytes, at, 4);
    if (name !== "EXIF" && name !== "XMP ") {
      const chunk = bytes.slice(at, end);
      if (name === "VP8X") chunk[8] = (chunk[8] ?? 0) & ~metadataFlags;
      parts.push(chunk);
    }
    at = end;
  }
  if (parts.length === 0) return null;
  const body = joined(parts);
  const head = bytes.slice(0, 12);
  view(head).setUint32(4, body.length + 4, true);
  return joined([head, body]);
}
