import { describe, expect, it } from "vitest";
import { factAt, withFact } from "@/components/drafts/facts-at";
import { groups, placeOf, screensOf } from "@/components/job/questions/screens";
import { subjects } from "@/components/job/questions/model";
import { stopsOf } from "@/components/job/stops";
import { jobSchema, parseDraft, type Job } from "@/lib/notify/job";

/** The worked record of a standard notice, as the project's examples give it. */
function standardJob(): Job {
  const parsed = parseDraft({
    format: "sealwire.job/1",
    jobNumber: "FEN-0001",
    stage: "installed",
    dates: { installed: "2026-11-20" },
    supply: { phases: 1, cutOutRatingA: 100, cutOutEvidence: "carrier-label", looped: "no", earthing: "TN-C-S" },
    site: { premises: "domestic", territory: "england" },
    circuits: [{ id: "main" }],
    chargepoints: [{ id: "cp1", circuit: "main" }],
    boards: [{ id: "b1" }],
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.fields));
  return parsed.value;
}

type Def = {
  type: string;
  shape?: Record<string, { _zod: { def: Def } }>;
  innerType?: { _zod: { def: Def } };
  element?: { _zod: { def: Def } };
  entries?: Record<string, string>;
};

/** Every leaf of the record's schema as a path; the items of the three lists stand for all of their kind. */
function leavesOf(def: Def, path: string): string[] {
  if (def.innerType) return leavesOf(def.innerType._zod.def, path);
  if (def.type === "object" && def.shape)
    return Object.entries(def.shape).flatMap(([key, inner]) => leavesOf(inner._zod.def, path ? `${path}.${key}` : key));
  if (def.type === "array" && def.element && /^(chargepoints|circuits|boards)$/.test(path))
    return leavesOf(def.element._zod.def, `${path}[0]`);
  return [path];
}

/** Facts a form never asks: the ledger's own, the firm's, ids that name items, and what the check and the photos make. */
const neverAsked = /^(format|jobNumber|firm\..*|declarations|evidence|(chargepoints|circuits|boards)\[0\]\.id)$/;

const stepsIn = (each: string | undefined, path: string) => [...(each ? [each] : []), ...path.split(".")];

/** The words the schema takes at a path; none where it takes no words. */
function wordsAt(def: Def, steps: string[]): string[] {
  if (def.innerType) return wordsAt(def.innerType._zod.def, steps);
  if (def.type === "array" && def.element) return wordsAt(def.element._zod.def, steps);
  const [step, ...rest] = steps;
  if (step !== undefined) {
    const inner = def.shape?.[step];
    return inner ? wordsAt(inner._zod.def, rest) : [];
  }
  return def.type === "enum" ? Object.keys(def.entries ?? {}) : [];
}

describe("the questions of the record", () => {
  it("reach every fact of the record on some screen (job-record: all of the record is reachable)", () => {
    const leaves = leavesOf(jobSchema._zod.def as unknown as Def, "").filter((path) => !neverAsked.test(path));
    const asked = new Set(
      Object.values(groups).flatMap((list) =>
        list.flatMap((group) => group.questions.map(({ path }) => (group.each ? `${group.each}[0].${path}` : path))),
      ),
    );
    const unreached = leaves.filter(
      (leaf) => ![...asked].some((path) => leaf === path || leaf.startsWith(`${path}.`) || path.startsWith(`${leaf}.`)),
    );
    expect(leaves.length).toBeGreaterThan(150);
    expect(unreached).toEqual([]);
  });

  it("ask only what the record holds", () => {
    const leaves = leavesOf(jobSchema._zod.def as unknown as Def, "");
    const invented = Object.values(groups)
      .flat()
      .flatMap((group) => group.questions.map(({ path }) => (group.each ? `${group.each}[0].${path}` : path)))
      .filter((path) => !leaves.some((leaf) => leaf === path || path.startsWith(`${leaf}.`)));
    expect(invented).toEqual([]);
  });

  it("put at most seven inputs on a screen (quality.md, For people using it)", () => {
    const job = standardJob();
    const everything = { ...job, supply: { ...job.supply, phases: 3 as const, cutOutEvidence: "fuse-seen" as const } };
    for (const record of [job, everything, { ...job, stage: "planned" as const }])
      for (const subject of subjects)
        for (const screen of screensOf(subject, record)) expect(screen.questions.length).toBeLessThanOrEqual(7);
  });

  it("offer only words and values the record takes", () => {
    const job = standardJob();
    const refused = subjects.flatMap((subject) =>
      screensOf(subject, job).flatMap((screen) =>
        screen.questions.flatMap((question) => {
          const values: unknown[] =
            question.kind === "choice"
              ? question.options.map(({ value }) => value)
              : question.kind === "several"
                ? question.options.map(({ value }) => [value])
                : question.kind === "number" && question.usual
                  ? [...question.usual]
                  : [];
          if (question.notKnown) values.push(question.notKnownValue ?? "unknown");
          return values
            .filter((value) => !parseDraft(withFact(job, question.at, value)).ok)
            .map((value) => `${question.at} = ${String(value)}`);
        }),
      ),
    );
    expect(refused).toEqual([]);
  });

  it("offer every word the record knows", () => {
    const missing = subjects.flatMap((subject) =>
      groups[subject].flatMap((group) =>
        group.questions.flatMap((question) => {
          if (question.kind !== "choice" && question.kind !== "several") return [];
          const offered = new Set(question.options.map(({ value }) => String(value)));
          if (question.notKnown) offered.add(question.notKnownValue ?? "unknown");
          const words = wordsAt(jobSchema._zod.def as unknown as Def, stepsIn(group.each, question.path));
          return words.filter((word) => !offered.has(word)).map((word) => `${question.path}: ${word}`);
        }),
      ),
    );
    expect(missing).toEqual([]);
  });

  it("lead from a missing fact to its own field", () => {
    const job = standardJob();
    expect(placeOf("supply.looped", job)).toMatchObject({ subject: "intake", at: "supply.looped" });
    expect(placeOf("chargepoints[0].smartCharging.randomDelay.defaultMaximumS", job)).toMatchObject({
      subject: "settings",
    });
    expect(placeOf("demand.existingA[0]", { ...job, demand: { ...job.demand, method: "measured" } })).toMatchObject({
      at: "demand.existingA",
    });
    expect(placeOf("customer.phone", job)).toMatchObject({ subject: "people" });
    expect(placeOf("evidence", job)).toMatchObject({ subject: "photos" });
  });

  it("ask a planned job for nothing that is measured or set", () => {
    const planned = { ...standardJob(), stage: "planned" as const };
    const asked = stopsOf(planned).flatMap(({ screen }) => screen?.questions.map(({ at }) => at) ?? []);
    expect(asked.filter((path) => /measured|firstUsePrompt|functionTest|handedOver/.test(path))).toEqual([]);
    expect(asked).toContain("dates.planned");
  });

  it("share a long group evenly, so that no screen of it holds a single question", () => {
    const job = standardJob();
    /* With Ze known there is one more to ask: eight questions about the supply. */
    const measured = { ...job, supply: { ...job.supply, externalLoopImpedanceOhm: 0.21 } };
    const screens = subjects.flatMap((subject) => screensOf(subject, measured));
    const shared = screens.filter(({ key, part }) => part > 1 || screens.some((one) => one.key === `${key}-part-2`));
    expect(shared.length).toBeGreaterThan(0);
    expect(shared.filter(({ questions }) => questions.length < 2).map(({ key }) => key)).toEqual([]);
  });

  it("walk a standard job in at most 25 screens (quality.md: page loads)", () => {
    expect(stopsOf(standardJob()).length).toBeLessThanOrEqual(25);
  });

  it("walk every chargepoint, circuit and board of a job", () => {
    const job = standardJob();
    const unit = job.chargepoints[0];
    if (!unit) throw new Error("no chargepoint");
    const two = { ...job, chargepoints: [unit, { ...unit, id: "cp2" }] };
    const asked = stopsOf(two).flatMap(({ screen }) => screen?.questions.map(({ at }) => at) ?? []);
    expect(asked).toContain("chargepoints[1].serial");
    expect(factAt(two, "chargepoints[1].id")).toBe("cp2");
  });
});
