import { execFileSync } from "node:child_process";
import JSZip from "jszip";
import { describe, expect, it } from "vitest";
import { rasterise } from "@/lib/server/rasterise";
import type { Block, DocumentModel } from "@/templates/model";
import { sha256 } from "@/templates/sha256";
import { toDocx } from "@/templates/to-docx";
import { everyBlock } from "./every-block";

const part = async (bytes: Uint8Array, name: string): Promise<string> => {
  const file = (await JSZip.loadAsync(bytes)).file(name);
  if (!file) throw new Error(`no part ${name}`);
  return file.async("string");
};

const everyDocx = toDocx(everyBlock, rasterise);
const documentXml = async () => part(await everyDocx, "word/document.xml");

/** ECMA-376 part 1 gives the elements named here. */
describe("a Word document", () => {
  it("is A4 with a text width of 170 mm", async () => {
    expect(await documentXml()).toMatch(/<w:pgSz w:w="11906" w:h="16838"/);
    expect(await documentXml()).toMatch(
      /<w:pgMar [^>]*w:right="1134"[^>]*w:left="1134"|<w:pgMar [^>]*w:left="1134"[^>]*w:right="1134"/,
    );
  });

  it("is in British English, in real styles with one title", async () => {
    const styles = await part(await everyDocx, "word/styles.xml");
    expect(styles).toContain('<w:lang w:val="en-GB"/>');
    const xml = await documentXml();
    expect(xml.match(/w:pStyle w:val="Title"/g)).toHaveLength(1);
    for (const level of [1, 2, 3]) expect(xml).toContain(`w:pStyle w:val="Heading${level}"`);
  });

  it("names what stands in for a face that is not installed", async () => {
    const fonts = await part(await everyDocx, "word/fontTable.xml");
    for (const face of ["Bitter", "Instrument Sans", "Spline Sans Mono"]) expect(fonts).toContain(`w:name="${face}"`);
    expect(fonts).toContain('<w:altName w:val="Georgia"/>');
  });

  it("has a head with firm, job and version, and a foot with the page of the pages", async () => {
    const names = Object.keys((await JSZip.loadAsync(await everyDocx)).files);
    const header = await part(await everyDocx, names.find((name) => /header\d\.xml$/.test(name)) ?? "");
    const footer = await part(await everyDocx, names.find((name) => /footer\d\.xml$/.test(name)) ?? "");
    expect(header).toContain("Fenwold Electrical Ltd");
    expect(header).toContain("FEN-0147, version 2");
    expect(footer).toContain("Issued 1 December 2026, 09:00. Rule set 2026-12-01.1.");
    expect(footer).toMatch(/PAGE<.*NUMPAGES</s);
  });

  it("has tables of fixed columns whose rows do not split and whose head rows repeat", async () => {
    const xml = await documentXml();
    const tables = xml.match(/<w:tbl>.*?<\/w:tbl>/gs) ?? [];
    expect(tables.length).toBeGreaterThan(4);
    for (const table of tables) {
      expect(table).toContain('<w:tblLayout w:type="fixed"/>');
      const widths = [...table.matchAll(/<w:gridCol w:w="(\d+)"/g)].map(([, width]) => Number(width));
      expect(widths.reduce((sum, width) => sum + width, 0)).toBe(9638);
      expect(table.match(/<w:tr>|<w:tr /g)?.length).toBe(table.match(/<w:cantSplit\/>/g)?.length);
    }
    expect(xml.match(/<w:tblHeader\/>/g)).toHaveLength(1);
  });

  it("describes every picture in words", async () => {
    const xml = await documentXml();
    const pictures = xml.match(/<wp:docPr\b[^>]*>/g) ?? [];
    expect(pictures.length).toBeGreaterThan(6);
    for (const picture of pictures) expect(picture).toMatch(/descr="[^"]+"/);
    const ids = pictures.map((picture) => /\bid="(\d+)"/.exec(picture)?.[1]);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it("has no macro, link to outside, tracked change or field that asks to be updated", async () => {
    const zip = await JSZip.loadAsync(await everyDocx);
    const all = await Promise.all(
      Object.keys(zip.files).map(async (name) => [name, (await zip.file(name)?.async("string")) ?? ""] as const),
    );
    expect(all.some(([name]) => name.includes("vba"))).toBe(false);
    for (const [, text] of all) expect(text).not.toMatch(/TargetMode="External"|<w:ins |<w:del |<w:updateFields/);
  });

  it("bears the issue time as its dates, and firm and job in its properties", async () => {
    const core = await part(await everyDocx, "docProps/core.xml");
    expect(core.match(/2026-12-01T09:00:00Z/g)).toHaveLength(2);
    expect(core).toContain("<dc:title>Every block, FEN-0147, version 2</dc:title>");
    expect(core).toContain("<dc:creator>Fenwold Electrical Ltd</dc:creator>");
  });
});

describe("the same model gives the same bytes", () => {
  it("twice in one process, whatever was written in between", async () => {
    const first = await sha256(await everyDocx);
    await toDocx({ ...everyBlock, title: "Another" }, rasterise);
    expect(await sha256(await toDocx(everyBlock, rasterise))).toBe(first);
  });

  it("in other processes under another clock and time zone", async () => {
    const script = `
      import { toDocx } from "@/templates/to-docx";
      import { sha256 } from "@/templates/sha256";
      import { rasterise } from "@/lib/server/rasterise";
      import { everyBlock } from "@/tests/templates/every-block";
      const ahead = Number(process.env.AHEAD_MS);
      const RealDate = Date;
      globalThis.Date = class extends RealDate {
        constructor(...given) { given.length ? super(...given) : super(RealDate.now() + ahead); }
        static now() { return RealDate.now() + ahead; }
      };
      console.log(await sha256(await toDocx(everyBlock, rasterise)));`;
    const run = (TZ: string, aheadMs: number) =>
      execFileSync("node", ["--import", "tsx", "--input-type=module", "-e", script], {
        env: { ...process.env, TZ, AHEAD_MS: String(aheadMs) },
        encoding: "utf8",
      }).trim();
    const expected = await sha256(await everyDocx);
    expect(run("Pacific/Auckland", 0)).toBe(expected);
    expect(run("America/St_Johns", 9 * 31_557_600_000)).toBe(expected);
  }, 60_000);
});

describe("text that a careless writer would break on", () => {
  const withText = (text: string): DocumentModel => ({
    ...everyBlock,
    title: text,
    firmName: text,
    blocks: [
      { kind: "heading", level: 1, text },
      {
        kind: "paragraph",
        text: [
          { text, strong: true },
          { text, mono: true },
        ],
      },
      { kind: "facts", rows: [{ label: text, value: text }] },
      { kind: "list", ordered: true, items: [text] },
      { kind: "caution", title: text, text },
      { kind: "workings", title: text, lines: [text] },
    ],
  });

  it("is stripped of what XML forbids and keeps the rest", async () => {
    const xml = await part(
      await toDocx(withText("a\u0000b\u0008c\uFFFFd\uD800e\u202Ef ]]> <w:p/> {{x}} & \u{1F50C}"), rasterise),
      "word/document.xml",
    );
    expect(xml).toContain("abcdef ]]&gt; &lt;w:p/&gt; {{x}} &amp; \u{1F50C}");
    expect(xml).not.toMatch(/[\u0000-\u0008\u000B\u000C\u000E-\u001F\uFFFE\uFFFF]/);
  });

  it("is never taken for a field code", async () => {
    const xml = await part(
      await toDocx(withText('{ HYPERLINK "http://x.example.com" }'), rasterise),
      "word/document.xml",
    );
    expect(xml).not.toMatch(/<w:fldSimple|<w:instrText|<w:hyperlink/);
  });
});

it("a kind of block without a writer is refused by name", async () => {
  const unknown = { kind: "hologram" } as unknown as Block;
  await expect(toDocx({ ...everyBlock, blocks: [unknown] }, rasterise)).rejects.toThrow(/hologram/);
});
