import JSZip from "jszip";
import { archive, type ArchiveEntry } from "../zip";
import { faces, standIns } from "./measures";

const namespace = "http://schemas.openxmlformats.org/wordprocessingml/2006/main";

const families = { heading: "roman", text: "swiss", mono: "modern" } as const;

/** The faces with what stands in for them where they are not installed. */
const fontTable =
  `<?xml version="1.0" encoding="UTF-8" standalone="yes"?><w:fonts xmlns:w="${namespace}">` +
  (Object.keys(faces) as (keyof typeof faces)[])
    .map(
      (use) =>
        `<w:font w:name="${faces[use]}"><w:altName w:val="${standIns[use]}"/><w:charset w:val="00"/>` +
        `<w:family w:val="${families[use]}"/><w:pitch w:val="${use === "mono" ? "fixed" : "variable"}"/></w:font>`,
    )
    .join("") +
  `</w:fonts>`;

const isText = (name: string) => name.endsWith(".xml") || name.endsWith(".rels");

/** Numbers the drawings of one part from one; the library counts them over the life of the process. */
function numbered(xml: string): string {
  let next = 0;
  return xml.replace(/(<wp:docPr\b[^>]*?\bid=")[^"]*(")/g, (_, before, after) => `${before}${++next}${after}`);
}

function dated(xml: string, instant: string): string {
  const day = `${instant.slice(0, 19)}Z`;
  return xml.replace(/(<dcterms:created[^>]*>)[^<]*/, `$1${day}`).replace(/(<dcterms:modified[^>]*>)[^<]*/, `$1${day}`);
}

/**
 * The document without what differs from one run to the next: the clock, counters kept by the process, the dates
 * of the archive. `issuedAt` becomes its day of making.
 */
export async function normalised(bytes: ArrayBuffer, issuedAt: string): Promise<Uint8Array> {
  const zip = await JSZip.loadAsync(bytes);
  const instant = new Date(issuedAt).toISOString();
  const names = Object.keys(zip.files)
    .filter((name) => !zip.files[name]?.dir)
    .sort((a, b) => rank(a) - rank(b) || (a < b ? -1 : 1));
  const entries = await Promise.all(
    names.map(async (name): Promise<ArchiveEntry> => {
      const file = zip.files[name];
      if (!file) throw new Error(`The document lost its part "${name}".`);
      if (!isText(name)) return { name, bytes: await file.async("uint8array"), store: true };
      const xml = name === "word/fontTable.xml" ? fontTable : await file.async("string");
      return { name, bytes: name === "docProps/core.xml" ? dated(xml, instant) : numbered(xml) };
    }),
  );
  return archive(entries);
}

/** A reader of the format expects the list of content types first. */
const rank = (name: string) => (name === "[Content_Types].xml" ? 0 : 1);
