import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { aboveGroundSeparationM } from "@/lib/calc/parameters/open-pen";
import type { OwnFigureName } from "./firm-rules";
import { hasTrait } from "./operators";
import { dwellingLimitA, labelDoubtA, noticeDays, noticeDaysByInstallDay } from "./parameters/network";

/** Days after installing that the operator itself allows for a notice. */
export const operatorNoticeDays = (operatorId: string, on: IsoDate): number =>
  valueAt(hasTrait(operatorId, "notice-by-install-day") ? noticeDaysByInstallDay : noticeDays, on);

/** What the register holds where a firm may set its own: the figure, null when it holds none, and how it is said. */
export type RegisterFigure = { value: number | null; words: string };

const figures: Record<OwnFigureName, (operatorId: string, on: IsoDate) => RegisterFigure> = {
  noticeDays: (operatorId, on) => {
    const value = operatorNoticeDays(operatorId, on);
    return { value, words: value === 0 ? "0 days, by the day of installing" : `${value} days` };
  },
  buriedSeparationM: (_operatorId, on) => ({
    value: null,
    words: `none below ground; ${valueAt(aboveGroundSeparationM, on)} m above it`,
  }),
  asksFirstAboveA: (operatorId, on) => {
    if (hasTrait(operatorId, "supply-table"))
      return { value: null, words: "this operator’s table of supplies in place of such a figure" };
    const value = valueAt(dwellingLimitA, on);
    return { value, words: `${value} A` };
  },
  assumesFuseA: (operatorId, on) => {
    if (!hasTrait(operatorId, "labels-in-doubt")) return { value: null, words: "none, so a label is taken as read" };
    const value = valueAt(labelDoubtA, on);
    return { value, words: `${value} A` };
  },
};

/** The register's figure for an operator on the day of the work. Throws NoValueInForce on a day it does not cover. */
export const registerFigure = (name: OwnFigureName, operatorId: string, on: IsoDate): RegisterFigure =>
  figures[name](operatorId, on);

/**
 * Whether a firm's figure asks for less than the register: more days, more amperes before asking, or buried metal
 * nearer than the register allows above ground. A fuse to be expected only ever asks for more.
 */
export function isLooser(name: OwnFigureName, value: number, operatorId: string, on: IsoDate): boolean {
  if (name === "assumesFuseA") return false;
  if (name === "buriedSeparationM") return value < valueAt(aboveGroundSeparationM, on);
  const register = registerFigure(name, operatorId, on).value;
  return register !== null && value > register;
}
