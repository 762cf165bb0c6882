import { createRequire } from "node:module";
import { describe, expect, it } from "vitest";
import type { Drawing } from "@/templates/drawings/svg";
import { demandChart, demandDayChart } from "@/templates/drawings/demand-chart";
import { singleLine, singleLineSheets } from "@/templates/drawings/single-line";
import { textWidth } from "@/templates/drawings/text-width";
import { touchVoltage } from "@/templates/drawings/touch-voltage";
import { stretchesOf, weekChart } from "@/templates/drawings/week-chart";
import { drawingsOf } from "@/templates/drawings-of";
import { samples } from "./generated-jobs";

type Face = {
  unitsPerEm: number;
  glyphForCodePoint(code: number): { advanceWidth: number };
  hasGlyphForCodePoint(code: number): boolean;
};
const fontkit = createRequire(import.meta.url)("fontkit") as { openSync(path: string): Face };
const face = (path: string) => fontkit.openSync(`node_modules/${path}`);
const regular = face("@expo-google-fonts/instrument-sans/400Regular/InstrumentSans_400Regular.ttf");
const semibold = face("@expo-google-fonts/instrument-sans/600SemiBold/InstrumentSans_600SemiBold.ttf");
const fallback = face("pdfmake/fonts/Roboto/Roboto-Regular.ttf");

const unescaped = (text: string) =>
  text
    .replace(/&lt;/g, "<")
    .replace(/&gt;/g, ">")
    .replace(/&quot;/g, '"')
    .replace(/&amp;/g, "&");

type Label = { text: string; left: number; right: number; top: number; bottom: number };

/** Boxes of every label, measured with the font file and not with the tables the drawings use. */
function labelsOf({ svg }: Drawing): Label[] {
  return [...svg.matchAll(/<text([^>]*)>(.*?)<\/text>/g)].map(([, attributes = "", inner = ""]) => {
    const read = (name: string) => Number(new RegExp(`(?:^|\\s)${name}="([-\\d.]+)"`).exec(attributes)?.[1]);
    const size = read("font-size");
    const strong = attributes.includes('font-weight="600"');
    const text = unescaped(inner.replace(/<[^>]*>/g, ""));
    const width = [...text].reduce((sum, character) => {
      const code = character.codePointAt(0) ?? 32;
      const own = strong ? semibold : regular;
      const used = own.hasGlyphForCodePoint(code) ? own : fallback;
      return sum + (used.glyphForCodePoint(code).advanceWidth / used.unitsPerEm) * size;
    }, 0);
    const first = /^<tspan x="([-\d.]+)"/.exec(inner);
    const x = first ? Number(first[1]) : read("x");
    const anchor = /text-anchor="(\w+)"/.exec(attributes)?.[1] ?? "start";
    const left = first || anchor === "start" ? x : anchor === "end" ? x - width : x - width / 2;
    const y = read("y");
    return { text, left, right: left + width, top: y - size * 0.74, bottom: y + size * 0.2 };
  });
}

function overlapsOf(drawing: Drawing): string[] {
  const labels = labelsOf(drawing).filter(({ text }) => text.trim() !== "");
  return labels.flatMap((a, index) =>
    labels
      .slice(index + 1)
      .filter(
        (b) => a.left < b.right - 0.5 && b.left < a.right - 0.5 && a.top < b.bottom - 0.5 && b.top < a.bottom - 0.5,
      )
      .map((b) => `"${a.text}" over "${b.text}"`),
  );
}

function outsideOf(drawing: Drawing): string[] {
  const [, , width = 0, height = 0] = (/viewBox="([^"]*)"/.exec(drawing.svg)?.[1] ?? "").split(" ").map(Number);
  return labelsOf(drawing)
    .filter(({ left, right, top, bottom }) => left < -1 || top < -1 || right > width + 1 || bottom > height + 1)
    .map(({ text }) => text);
}

const jobs = samples(200);

describe("every drawing over generated records", () => {
  const drawings = jobs.flatMap(({ job, assessment }) => [
    ...drawingsOf(job, assessment).map(({ drawing }) => drawing),
    ...singleLineSheets(job, assessment.operator.name),
  ]);

  it("has no label over another and none outside the picture", () => {
    expect(drawings.length).toBeGreaterThan(400);
    expect(drawings.flatMap(overlapsOf)).toEqual([]);
    expect(drawings.flatMap(outsideOf)).toEqual([]);
  });

  it("has glyphs for every character it shows", () => {
    const shown = new Set(drawings.flatMap((drawing) => labelsOf(drawing).flatMap(({ text }) => [...text])));
    const missing = [...shown].filter((character) => {
      const code = character.codePointAt(0) ?? 0;
      return (
        !(regular.hasGlyphForCodePoint(code) && semibold.hasGlyphForCodePoint(code)) &&
        !fallback.hasGlyphForCodePoint(code)
      );
    });
    expect(missing).toEqual([]);
  });

  it("says in words what it shows, and prints no empty value", () => {
    for (const { svg, alt } of drawings) {
      expect(alt.length).toBeGreaterThan(40);
      expect(`${alt}${svg}`).not.toMatch(/undefined|null|NaN|\[object/);
    }
  });

  it("fits a page of A4", () => {
    for (const { widthMm, heightMm } of drawings) {
      expect(widthMm).toBeLessThanOrEqual(170);
      expect(heightMm).toBeLessThanOrEqual(232);
    }
  });
});

describe("text widths", () => {
  it("are those of the font files, kerning left out", () => {
    for (const text of ["Main earthing terminal", "6/2.5 mm, 18 m", "B40 RCBO", "0123456789 A-Z & (x)"])
      for (const [strong, own] of [
        [false, regular],
        [true, semibold],
      ] as const) {
        const real = [...text].reduce(
          (sum, character) => sum + own.glyphForCodePoint(character.charCodeAt(0)).advanceWidth,
          0,
        );
        expect(textWidth(text, own.unitsPerEm, strong)).toBeCloseTo(real, 5);
      }
  });
});

describe("single-line diagram", () => {
  it("shows every board, circuit and chargepoint of the record on its sheets", () => {
    for (const { job, assessment } of jobs) {
      const words = singleLineSheets(job, assessment.operator.name)
        .map(({ alt }) => alt)
        .join(" ");
      for (const { id } of job.boards) expect(words).toContain(`Board ${id}`);
      for (const { id } of job.circuits) expect(words).toContain(`Circuit ${id},`);
      const units = words.match(/open PEN: /g)?.length ?? 0;
      expect(units).toBe(job.chargepoints.length);
    }
  });

  it("draws all of it in one picture for a screen", () => {
    const { job, assessment } = jobs[0] ?? expect.unreachable();
    expect(singleLine(job, assessment.operator.name, "screen").alt).toContain("Single-line diagram");
  });
});

/** Worked by hand: a window that runs past midnight belongs to the day on which it starts. */
describe("week of charging hours", () => {
  const night = { days: ["sun" as const], from: "22:00", to: "08:00" };

  it("parts a window at midnight and carries Sunday into Monday", () => {
    expect(stretchesOf({ windows: [night], aheadMin: 0 })).toEqual([
      { day: "sun", fromMin: 1320, toMin: 1440 },
      { day: "mon", fromMin: 0, toMin: 480 },
    ]);
  });

  it("shows a clock on UTC an hour later in summer", () => {
    expect(stretchesOf({ windows: [night], aheadMin: 60 })).toEqual([
      { day: "sun", fromMin: 1380, toMin: 1440 },
      { day: "mon", fromMin: 0, toMin: 540 },
    ]);
  });

  it("takes equal times as a whole day", () => {
    expect(stretchesOf({ windows: [{ days: ["sat"], from: "06:00", to: "06:00" }], aheadMin: 0 })).toEqual([
      { day: "sat", fromMin: 360, toMin: 1440 },
      { day: "sun", fromMin: 0, toMin: 360 },
    ]);
  });

  it("takes an end at the beginning of a peak as touching, not inside", () => {
    const peak = [{ from: "08:00", to: "11:00", days: ["mon" as const] }];
    expect(weekChart({ windows: [night], peak, aheadMin: 0 }).alt).toContain("None of them is inside peak hours");
    expect(weekChart({ windows: [night], peak, aheadMin: 60 }).alt).toContain("08:00 to 09:00 Monday");
  });
});

describe("charts keep their labels apart whatever the figures", () => {
  it.each([
    [0, 0, 60, 100],
    [24.8, 56.8, 60, 100],
    [59, 60, 60, 60],
    [99.5, 131.5, 60, 63],
    [61, 61, 60, 61],
    [5000, 5000, null, null],
  ])("demand of %s A to %s A against %s A and %s A", (existingA, afterA, noticeA, cutOutA) => {
    const bars = demandChart(
      [
        { name: "L1", existingA, afterA },
        { name: "L2", existingA, afterA: null },
        { name: "L3", existingA: null, afterA: null },
      ],
      { noticeA, cutOutA },
    );
    expect(overlapsOf(bars)).toEqual([]);
    for (const hour of [0, 24, 47]) {
      const houseA = Array.from({ length: 48 }, (_, index) => (index === hour ? existingA : existingA / 2));
      expect(overlapsOf(demandDayChart({ houseA, existingA, afterA }, { noticeA, cutOutA }))).toEqual([]);
    }
  });

  it.each([0.01, 0.1, 1.3, 1.32, 1.4, 90, 1000, 20000])("electrode measured at %s Ω", (ohm) => {
    const curve = Array.from({ length: 61 }, (_, index) => ({ ohm: 10 ** (index / 20 - 1), volts: index * 4 }));
    for (const mostOhm of [0.02, 1.32, 88, 500, null])
      expect(
        overlapsOf(touchVoltage({ curve, limitV: 70, mostOhm, measured: { ohm, volts: 100 }, demandA: 60 })),
      ).toEqual([]);
  });
});
