import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, describe, expect, it } from "vitest";
import { ruleset } from "@/lib/notify/assess";
import { rulesList } from "@/lib/notify/rules-list";
import { recordWith } from "./record";

const root = new URL("../../", import.meta.url).pathname;
const folder = mkdtempSync(join(tmpdir(), "sealwire-assess-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const run = (script: string, ...args: string[]) =>
  spawnSync(process.execPath, ["--import", "tsx", `scripts/${script}.ts`, ...args], {
    cwd: root,
    encoding: "utf8",
    timeout: 60_000,
    // Another zone than London: the day must not follow the machine.
    env: { ...process.env, TZ: "Pacific/Auckland", NODE_OPTIONS: "" },
  });

function fileWith(name: string, content: string): string {
  const path = join(folder, name);
  writeFileSync(path, content);
  return path;
}

describe("npm run assess", { timeout: 120_000 }, () => {
  const example = join(root, "tests/examples/fen-0153-stop.json");

  it("prints the assessment and ends with 0 also when the answer is bad news", () => {
    const { status, stdout, stderr } = run("assess", example, "--as-at", "2026-12-01");
    expect([status, stderr]).toEqual([0, ""]);
    expect(JSON.parse(stdout)).toMatchObject({
      format: "sealwire.assessment/1",
      asAt: "2026-12-01",
      ruleset,
      route: { demand: "stop" },
    });
  });

  it("names every field that does not parse, a line each, and ends with 2", () => {
    const record = recordWith({ "supply.cutOutRatingA": "100", "dates.installed": "2026-02-30" });
    const { status, stdout, stderr } = run("assess", fileWith("bad.json", JSON.stringify(record)));
    expect([status, stdout]).toEqual([2, ""]);
    const lines = stderr.trim().split("\n");
    expect(lines).toHaveLength(2);
    expect(lines.map((line) => line.split(":")[0]).sort()).toEqual(["dates.installed", "supply.cutOutRatingA"]);
  });

  it("refuses contradictions, files that are not JSON, missing files and calls it does not know", () => {
    const contradiction = recordWith({ "dates.installed": null });
    expect(run("assess", fileWith("no-date.json", JSON.stringify(contradiction)))).toMatchObject({
      status: 2,
      stderr: expect.stringMatching(/^dates\.installed: /),
    });
    expect(run("assess", fileWith("not.json", "{"))).toMatchObject({
      status: 2,
      stderr: expect.stringMatching(/is not JSON/),
    });
    expect(run("assess", join(folder, "nowhere.json"))).toMatchObject({
      status: 2,
      stderr: expect.stringMatching(/cannot be read/),
    });
    expect(run("assess")).toMatchObject({ status: 2, stderr: expect.stringMatching(/^usage/) });
    expect(run("assess", example, "--as-at", "1 December")).toMatchObject({
      status: 2,
      stderr: expect.stringMatching(/YYYY-MM-DD/),
    });
    expect(run("assess", example, "--today")).toMatchObject({ status: 2, stderr: expect.stringMatching(/usage/) });
  });

  it("says what it did not read, and assesses all the same", () => {
    const record = { ...recordWith(), colour: "green" };
    const { status, stderr } = run("assess", fileWith("more.json", JSON.stringify(record)), "--as-at", "2026-12-01");
    expect([status, stderr]).toEqual([0, "colour: is not a field of the job record and was not read\n"]);
  });
});

describe("npm run rules", { timeout: 60_000 }, () => {
  it("lists every rule with what it reads and its sources", () => {
    const { status, stdout } = run("rules");
    expect(status).toBe(0);
    for (const { id } of rulesList) expect(stdout).toContain(`\n${id}  `);
    const json = JSON.parse(run("rules", "--json").stdout);
    expect(json.rules).toHaveLength(rulesList.length);
  });
});

it("the examples here are read as they stand", () => {
  expect(JSON.parse(readFileSync(join(root, "tests/examples/expected.json"), "utf8"))).toHaveProperty(
    "fen-0147-notice",
  );
});
