import JSZip from "jszip";

/** The day every entry of every archive bears: archives must not know when they were made. */
export const entryDate = new Date(Date.UTC(1980, 0, 1));

export type ArchiveEntry = { name: string; bytes: Uint8Array | string; store?: boolean };

/**
 * A zip of the entries in the order given: the same bytes for the same entries on any machine.
 * Already packed files are stored, text is deflated.
 */
export function archive(entries: readonly ArchiveEntry[]): Promise<Uint8Array> {
  const zip = new JSZip();
  for (const { name, bytes, store } of entries)
    zip.file(name, bytes, {
      date: entryDate,
      createFolders: false,
      compression: store ? "STORE" : "DEFLATE",
      compressionOptions: { level: 6 },
    });
  return zip.generateAsync({ type: "uint8array", platform: "UNIX" });
}
