import { execFile } from "node:child_process";
import { mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";
import { afterAll, describe, expect, it } from "vitest";
import { rasterise } from "@/lib/server/rasterise";
import { documentsFor } from "@/templates/documents";
import type { DocumentModel } from "@/templates/model";
import { toDocx } from "@/templates/to-docx";
import { openXmlFaults } from "../support/open-xml";
import { everyBlock } from "./every-block";
import { example, exampleNames, samples } from "./generated-jobs";

/**
 * Documents opened by programs that are not ours: the Open XML SDK's schema validator, LibreOffice, poppler.
 * Slow, so the files of this kind run apart from the quick tests.
 */

const run = promisify(execFile);
const folder = mkdtempSync(join(tmpdir(), "opened-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

async function written(model: DocumentModel, name: string): Promise<string> {
  const path = join(folder, `${name}.docx`);
  writeFileSync(path, await toDocx(model, rasterise));
  return path;
}

async function faultsOf(model: DocumentModel, name: string): Promise<string[]> {
  const errors = await openXmlFaults(await written(model, name));
  return errors.map((error) => `${name}: ${JSON.stringify(error)}`);
}

const examples = exampleNames.flatMap((name) => {
  const { job, assessment, issue } = example(name);
  return documentsFor(job, assessment, issue).map((model) => ({ name: `${name}-${model.slug}`, model }));
});

describe("the Open XML schema validator finds no fault", () => {
  it("in any block, nor in any document of the examples", async () => {
    const faults = [await faultsOf(everyBlock, "every-block")];
    for (const { name, model } of examples) faults.push(await faultsOf(model, name));
    expect(faults.flat()).toEqual([]);
  }, 300_000);

  it("in 100 generated jobs, one document of each in turn", async () => {
    const faults: string[] = [];
    for (const [index, { job, assessment, issue }] of samples(100).entries()) {
      const documents = documentsFor(job, assessment, issue);
      const model = documents[index % documents.length] ?? expect.unreachable();
      faults.push(...(await faultsOf(model, `generated-${index}-${model.slug}`)));
    }
    expect(faults).toEqual([]);
  }, 600_000);
});

describe("LibreOffice", () => {
  it("opens every document of the examples and prints all of it", async () => {
    const [source, target] = [join(folder, "in"), join(folder, "out")];
    for (const each of [source, target]) mkdirSync(each);
    for (const { name, model } of examples) writeFileSync(join(source, `${name}.docx`), await toDocx(model, rasterise));
    const profile = `-env:UserInstallation=file://${join(folder, "profile")}`;
    const files = readdirSync(source).map((name) => join(source, name));
    await run("soffice", [profile, "--headless", "--convert-to", "pdf", "--outdir", target, ...files], {
      timeout: 240_000,
    });
    expect(readdirSync(target)).toHaveLength(examples.length);
    for (const { name, model } of examples) {
      const pdf = join(target, `${name}.pdf`);
      const { stdout: info } = await run("pdfinfo", [pdf]);
      expect(info).toMatch(/Page size:\s+595\.\d+ x 841\.\d+ pts \(A4\)/);
      const pages = Number(/Pages:\s+(\d+)/.exec(info)?.[1]);
      const { stdout: text } = await run("pdftotext", ["-layout", pdf, "-"]);
      expect(text).toContain(`Page ${pages} of ${pages}`);
      expect(text).toContain(`${model.jobNumber}, version ${model.version}`);
      expect(text).not.toMatch(/\bundefined\b|\bnull\b|\bNaN\b|\[object/);
      const figures = model.blocks.filter(({ kind }) => kind === "figure").length;
      const { stdout: images } = await run("pdfimages", ["-list", pdf]);
      // A picture with a mask has a row of its own for the mask.
      const wide = images
        .split("\n")
        .map((row) => row.trim().split(/\s+/))
        .filter(([, , kind, width]) => kind === "image" && Number(width) > 1000);
      expect(wide.length, name).toBe(figures);
    }
  }, 300_000);
});
