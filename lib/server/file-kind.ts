/** What a file is by its first bytes, whatever its name says. */
export type FileKind = "jpeg" | "png" | "webp" | "heic" | "gif" | "pdf" | "markup" | "empty" | "other";

const latin = (bytes: Uint8Array, from: number, to: number) =>
  new TextDecoder("latin1").decode(bytes.subarray(from, to));

/** Brands of ISO base media files that hold HEIF pictures (ISO/IEC 23008-12 annex B). */
const heifBrands = new Set(["heic", "heix", "heim", "heis", "hevc", "hevx", "mif1", "msf1", "avif", "avis"]);

/** Signatures: JPEG ISO/IEC 10918-1 B.1.1.3, PNG section 5.2, WebP container (RFC 9649), PDF ISO 32000-1 7.5.2. */
export function fileKind(bytes: Uint8Array): FileKind {
  if (bytes.length === 0) return "empty";
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return "jpeg";
  if (latin(bytes, 0, 8) === "\x89PNG\r\n\x1a\n") return "png";
  if (latin(bytes, 0, 4) === "RIFF" && latin(bytes, 8, 12) === "WEBP") return "webp";
  if (latin(bytes, 4, 8) === "ftyp" && heifBrands.has(latin(bytes, 8, 12))) return "heic";
  if (latin(bytes, 0, 4) === "GIF8") return "gif";
  if (latin(bytes, 0, 1024).includes("%PDF-")) return "pdf";
  if (/^(?:\xef\xbb\xbf)?\s*</.test(latin(bytes, 0, 256))) return "markup";
  return "other";
}
