import type { OwnFigureName } from "@/lib/notify/firm-rules";

type Asked = { label: string; unit: string; inputMode: "numeric" | "decimal"; hint: string };

/** How each figure that a firm may set is asked for. */
export const askedFor: Record<OwnFigureName, Asked> = {
  noticeDays: {
    label: "Notice within",
    unit: "days",
    inputMode: "numeric",
    hint: "After installing; 0 for by the day of installing.",
  },
  asksFirstAboveA: {
    label: "Asked first above, at a dwelling",
    unit: "A",
    inputMode: "decimal",
    hint: "Demand after the work, a phase.",
  },
  assumesFuseA: {
    label: "Refits cut-outs with a fuse of",
    unit: "A",
    inputMode: "numeric",
    hint: "A carrier label alone is then no evidence, and the fact stays open.",
  },
  buriedSeparationM: {
    label: "Between buried electrodes",
    unit: "m",
    inputMode: "decimal",
    hint: "The distance this operator asks for.",
  },
};

/** Order on the page: what moves the day, what moves the route, then the earth. */
export const figureOrder: readonly OwnFigureName[] = [
  "noticeDays",
  "asksFirstAboveA",
  "assumesFuseA",
  "buriedSeparationM",
];
