import type { Manifest } from "@/templates/manifest";
import { sha256 } from "@/templates/sha256";

export type FileCheck = {
  name: string;
  standing: "matches" | "altered" | "missing" | "added";
  sealed: { bytes: number; sha256: string } | null;
  found: { bytes: number; sha256: string } | null;
};

export type PackCheck = {
  manifest: Manifest;
  /** SHA-256 of the file as dropped; its first eight characters are the seal's. */
  fingerprint: string;
  files: FileCheck[];
};

export type PackCheckResult = { ok: true; value: PackCheck } | { ok: false; message: string };

/** Written after the manifest, so they cannot stand in it. */
const beside = new Set(["MANIFEST.json", "SHA256SUMS"]);

const refuse = (message: string): PackCheckResult => ({ ok: false, message });

/**
 * Hashes every file of a pack again and lays it beside its manifest. Everything happens on this device.
 * Failures are sentences: not a zip, no manifest, a manifest of another kind.
 */
export async function checkPack(bytes: Uint8Array): Promise<PackCheckResult> {
  const { default: JSZip } = await import("jszip");
  const zip = await JSZip.loadAsync(bytes).catch(() => null);
  if (!zip) return refuse("This file is not a zip, or it is broken. Choose the pack as it was sent to you.");
  const manifestText = await zip.file("MANIFEST.json")?.async("string");
  if (!manifestText) return refuse("There is no MANIFEST.json in this zip, so it is not a sealed pack.");
  const manifest = readManifest(manifestText);
  if (!manifest) return refuse("The MANIFEST.json in this zip is not that of a sealed pack.");
  const found = new Map<string, { bytes: number; sha256: string }>();
  for (const entry of Object.values(zip.files)) {
    if (entry.dir || beside.has(entry.name)) continue;
    const content = await entry.async("uint8array").catch(() => null);
    if (!content) return refuse(`${entry.name} in this zip cannot be read: the file is broken.`);
    found.set(entry.name, { bytes: content.length, sha256: await sha256(content) });
  }
  return { ok: true, value: { manifest, fingerprint: await sha256(bytes), files: sideBySide(manifest, found) } };
}

function sideBySide(manifest: Manifest, found: ReadonlyMap<string, { bytes: number; sha256: string }>): FileCheck[] {
  const sealed = manifest.files.map(({ name, ...file }): FileCheck => {
    const here = found.get(name) ?? null;
    const standing = !here ? "missing" : here.sha256 === file.sha256 ? "matches" : "altered";
    return { name, standing, sealed: file, found: here };
  });
  const named = new Set(manifest.files.map(({ name }) => name));
  const added = [...found].filter(([name]) => !named.has(name));
  return [
    ...sealed,
    ...added.map(([name, here]): FileCheck => ({ name, standing: "added", sealed: null, found: here })),
  ];
}

function readManifest(text: string): Manifest | null {
  const read = parsed(text);
  if (typeof read !== "object" || read === null) return null;
  const manifest = read as Partial<Manifest>;
  const files: unknown = manifest.files;
  const whole =
    manifest.format === "sealwire.pack/1" &&
    typeof manifest.jobNumber === "string" &&
    typeof manifest.issuedAt === "string" &&
    Array.isArray(files) &&
    files.every((file) => typeof file?.name === "string" && typeof file?.sha256 === "string");
  return whole ? (manifest as Manifest) : null;
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
