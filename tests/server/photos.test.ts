import sharp from "sharp";
import { describe, expect, it } from "vitest";
import { exifTakenAt } from "@/lib/server/exif-time";
import { preparePhoto } from "@/lib/server/photos";

const plain = { width: 60, height: 40, channels: 3 as const, background: "#a8501f" };
const bytesOf = (text: string) => new TextEncoder().encode(text);
const codeOf = async (bytes: Uint8Array) => {
  const result = await preparePhoto(bytes);
  return result.ok ? "ok" : result.error.code;
};
const sentenceOf = async (bytes: Uint8Array) => {
  const result = await preparePhoto(bytes);
  return result.ok ? "ok" : result.error.message;
};

/** A JPEG with a place, a time and a turn in its EXIF, as a phone makes it. */
const fromPhone = (taken: string, extra: Record<string, string> = {}) =>
  sharp({ create: plain })
    .withExif({
      IFD0: { Make: "Fennel", Software: "phone 1" },
      IFD2: { DateTimeOriginal: taken, ...extra },
      IFD3: { GPSLatitudeRef: "N", GPSLatitude: "51/1 30/1 0/1", GPSLongitudeRef: "W", GPSLongitude: "0/1 7/1 0/1" },
    })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer();

describe("photos that are kept", () => {
  it("are turned upright, and hold no place, maker or other metadata", async () => {
    const sent = await fromPhone("2026:07:14 09:31:05");
    const before = await sharp(sent).metadata();
    expect([before.orientation, before.exif?.includes("Fennel")]).toEqual([6, true]);
    const kept = await preparePhoto(sent);
    if (!kept.ok) throw new Error(kept.error.message);
    const seen = await sharp(kept.value.bytes).metadata();
    expect(seen.exif ?? seen.xmp ?? seen.iptc ?? seen.icc).toBeUndefined();
    expect([kept.value.widthPx, kept.value.heightPx]).toEqual([40, 60]);
    expect(Buffer.from(kept.value.bytes).includes("Fennel")).toBe(false);
    // British Summer Time: 09:31:05 on the wall is 08:31:05 UTC (Summer Time Act 1972).
    expect(kept.value.takenAt).toBe("2026-07-14T08:31:05.000Z");
  });

  it("use the offset that the camera recorded, and winter time without one", async () => {
    const withOffset = await fromPhone("2026:07:14 09:31:05", { OffsetTimeOriginal: "+02:00" });
    expect(exifTakenAt((await sharp(withOffset).metadata()).exif)).toBe("2026-07-14T07:31:05.000Z");
    const winter = await fromPhone("2026:12:01 09:31:05");
    expect(exifTakenAt((await sharp(winter).metadata()).exif)).toBe("2026-12-01T09:31:05.000Z");
  });

  it("are at most 2048 px, and PNG and WebP become JPEG", async () => {
    const big = await sharp({ create: { ...plain, width: 4000, height: 1000 } })
      .png()
      .toBuffer();
    const kept = await preparePhoto(big);
    expect(kept.ok && [kept.value.widthPx, kept.value.heightPx, kept.value.bytes[0]]).toEqual([2048, 512, 0xff]);
    expect(await codeOf(await sharp({ create: plain }).webp().toBuffer())).toBe("ok");
  });
});

describe("files that are refused, each with its own sentence", () => {
  it.each<[string, Uint8Array, string, RegExp]>([
    ["HEIC", bytesOf("\0\0\0\x18ftypheic\0\0\0\0mif1heic"), "unsupported", /HEIC/],
    ["nothing at all", new Uint8Array(), "unsupported", /empty/],
    ["a PDF named .jpg", bytesOf("%PDF-1.7\n1 0 obj"), "unsupported", /PDF/],
    ["SVG", bytesOf('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'), "unsupported", /SVG/],
    ["HTML", bytesOf("\n <!doctype html><script>alert(1)</script>"), "unsupported", /web page/],
    ["a GIF", bytesOf("GIF89a..."), "unsupported", /GIF/],
    ["something else", bytesOf("PK\x03\x04 a zip"), "unsupported", /JPEG, PNG or WebP/],
    ["a JPEG in name of its first bytes only", new Uint8Array([0xff, 0xd8, 0xff, 1, 2, 3]), "unreadable", /damaged/],
    ["16 MB", new Uint8Array(16 * 1024 * 1024).fill(0xff), "too-large", /16\.0 MB/],
  ])("%s", async (_, bytes, code, sentence) => {
    expect(await codeOf(bytes)).toBe(code);
    expect(await sentenceOf(bytes)).toMatch(sentence);
  });

  it("a photo cut off half way", async () => {
    const noise = await sharp({
      create: { ...plain, width: 800, height: 600, noise: { type: "gaussian", mean: 128, sigma: 40 } },
    })
      .jpeg()
      .toBuffer();
    expect(await codeOf(noise.subarray(0, noise.length / 2))).toBe("unreadable");
  });

  it("65 megapixels, before they are unpacked", async () => {
    const wide = await sharp({ create: { ...plain, width: 10_000, height: 6_501 } })
      .png()
      .toBuffer();
    const start = performance.now();
    expect(await sentenceOf(wide)).toMatch(/64 megapixels/);
    expect(performance.now() - start).toBeLessThan(500);
  });

  it("an EXIF block of rubbish is not a time", () => {
    for (let length = 0; length < 60; length += 1) {
      expect(exifTakenAt(new Uint8Array(length).fill(0x49))).toBeNull();
    }
  });
});
