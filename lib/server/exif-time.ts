/**
 * When a photo was taken, read out of its EXIF block and nothing else of it kept.
 * Layout: CIPA DC-008 (Exif 2.32) section 4.6; TIFF 6.0 for the directories.
 */

const tags = { exifDirectory: 0x8769, takenAt: 0x9003, takenOffset: 0x9011 } as const;
const ascii = 2;

type Directory = Map<number, { type: number; count: number; at: number }>;

/** A reader of one TIFF block; every read is checked, for the bytes come from anywhere. */
function tiffOf(block: Uint8Array) {
  const view = new DataView(block.buffer, block.byteOffset, block.byteLength);
  const little = view.byteLength > 8 && view.getUint16(0) === 0x4949;
  const fits = (at: number, size: number) => at >= 0 && at + size <= view.byteLength;
  const u16 = (at: number) => (fits(at, 2) ? view.getUint16(at, little) : 0);
  const u32 = (at: number) => (fits(at, 4) ? view.getUint32(at, little) : 0);
  const directory = (at: number): Directory => {
    const entries: Directory = new Map();
    const count = Math.min(u16(at), 200);
    for (let entry = 0; entry < count; entry += 1) {
      const start = at + 2 + entry * 12;
      entries.set(u16(start), { type: u16(start + 2), count: u32(start + 4), at: start + 8 });
    }
    return entries;
  };
  const text = (entries: Directory, tag: number): string | null => {
    const entry = entries.get(tag);
    if (!entry || entry.type !== ascii || entry.count > 64) return null;
    const at = entry.count > 4 ? u32(entry.at) : entry.at;
    if (!fits(at, entry.count)) return null;
    return new TextDecoder("latin1")
      .decode(block.subarray(at, at + entry.count))
      .replace(/\0+$/, "")
      .trim();
  };
  return { first: () => directory(u32(4)), directory, text, u32 };
}

/** Minutes that the clocks of Great Britain and Northern Ireland are ahead of UTC at an instant. */
function londonOffsetMinutes(instantMs: number): number {
  const parts = new Intl.DateTimeFormat("en-GB", { timeZone: "Europe/London", timeZoneName: "longOffset" });
  const name = parts.formatToParts(instantMs).find((part) => part.type === "timeZoneName")?.value ?? "GMT";
  const found = /GMT([+-])(\d{2}):(\d{2})/.exec(name);
  return found ? (found[1] === "-" ? -1 : 1) * (Number(found[2]) * 60 + Number(found[3])) : 0;
}

/**
 * The instant as UTC ISO text, or null when the block has none or it makes no sense. A camera that recorded no
 * offset kept local time, and these photos are of sites in the United Kingdom.
 * @param block the EXIF block of a picture, with or without its `Exif` heading
 */
export function exifTakenAt(block: Uint8Array | undefined): string | null {
  if (!block) return null;
  const headed = new TextDecoder("latin1").decode(block.subarray(0, 4)) === "Exif";
  const tiff = tiffOf(headed ? block.subarray(6) : block);
  const entry = tiff.first().get(tags.exifDirectory);
  if (!entry) return null;
  const exif = tiff.directory(tiff.u32(entry.at));
  const found = /^(\d{4}):(\d\d):(\d\d) (\d\d):(\d\d):(\d\d)$/.exec(tiff.text(exif, tags.takenAt) ?? "");
  if (!found) return null;
  const [year, month, day, hour, minute, second] = found.slice(1).map(Number) as [
    number,
    number,
    number,
    number,
    number,
    number,
  ];
  const local = Date.UTC(year, month - 1, day, hour, minute, second);
  if (new Date(local).getUTCMonth() !== month - 1 || year < 2000) return null;
  const offset = /^([+-])(\d\d):(\d\d)$/.exec(tiff.text(exif, tags.takenOffset) ?? "");
  const minutes = offset
    ? (offset[1] === "-" ? -1 : 1) * (Number(offset[2]) * 60 + Number(offset[3]))
    : londonOffsetMinutes(local - londonOffsetMinutes(local) * 60_000);
  return new Date(local - minutes * 60_000).toISOString();
}
