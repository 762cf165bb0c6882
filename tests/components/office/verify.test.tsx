import JSZip from "jszip";
import { createHash } from "node:crypto";
import { describe, expect, it } from "vitest";
import { checkPack } from "@/components/verify/check-pack";

const hash = (text: string) => createHash("sha256").update(text).digest("hex");
const contents: Record<string, string> = { "00-cover.docx": "cover", "data/job.json": "{}", "photos/a.jpg": "photo" };

async function pack(change: (zip: JSZip) => void = () => undefined) {
  const zip = new JSZip();
  for (const [name, text] of Object.entries(contents)) zip.file(name, text);
  const files = Object.entries(contents).map(([name, text]) => ({ name, bytes: text.length, sha256: hash(text) }));
  const head = { format: "sealwire.pack/1", firm: "Fenwold Electrical Ltd", jobNumber: "FEN-0147", version: 2 };
  zip.file(
    "MANIFEST.json",
    JSON.stringify({ ...head, issuedAt: "2026-12-01T09:00:00Z", sealedBy: "Tam Orrell", files }),
  );
  zip.file("SHA256SUMS", files.map(({ name, sha256 }) => `${sha256}  ${name}\n`).join(""));
  change(zip);
  return zip.generateAsync({ type: "uint8array" });
}

const standings = async (bytes: Uint8Array) => {
  const result = await checkPack(bytes);
  if (!result.ok) return result.message;
  return Object.fromEntries(result.value.files.map(({ name, standing }) => [name, standing]));
};

// Hashes here come from node:crypto, those of the program from the Web Cryptography API: two implementations of FIPS 180-4.
describe("checking a pack's seal", () => {
  it("finds an untouched pack whole, and gives the fingerprint of the file", async () => {
    const bytes = await pack();
    expect(await standings(bytes)).toEqual({
      "00-cover.docx": "matches",
      "data/job.json": "matches",
      "photos/a.jpg": "matches",
    });
    const result = await checkPack(bytes);
    expect(result.ok && result.value.fingerprint).toBe(createHash("sha256").update(bytes).digest("hex"));
  });
  it("names a file that was altered, one that is missing and one that was added", async () => {
    const bytes = await pack((zip) => {
      zip.file("00-cover.docx", "another cover");
      zip.remove("photos/a.jpg");
      zip.file("06-extra.docx", "slipped in");
    });
    expect(await standings(bytes)).toEqual({
      "00-cover.docx": "altered",
      "data/job.json": "matches",
      "photos/a.jpg": "missing",
      "06-extra.docx": "added",
    });
  });
  it("says in a sentence why a file cannot be checked", async () => {
    expect(await standings(new TextEncoder().encode("%PDF-1.7"))).toMatch(/not a zip/);
    expect(await standings(await pack((zip) => zip.remove("MANIFEST.json")))).toMatch(/not a sealed pack/);
    expect(await standings(await pack((zip) => zip.file("MANIFEST.json", "{}")))).toMatch(/not that of a sealed pack/);
    expect(await standings(await pack((zip) => zip.file("MANIFEST.json", "no json")))).toMatch(/not that of/);
  });
});
