import { exactQuotient } from "../exact";

/** Line and protective conductor together, milliohms a metre at 20 °C. */
export const loopMilliohmPerM = (lineMilliohmPerM: number, protectiveMilliohmPerM: number): number =>
  lineMilliohmPerM + protectiveMilliohmPerM;

/** R1 + R2 of a run at working temperature, ohms. */
export const hotLoopOhm = (milliohmPerM: number, lengthM: number, hotMultiplier: number): number =>
  (milliohmPerM * lengthM * hotMultiplier) / 1000;

/** The printed loop limit of a circuit-breaker, ohms to two decimals: U0 Cmin over the current that trips it at once. */
export const breakerLoopLimitOhm = (given: {
  nominalV: number;
  factorMin: number;
  multiple: number;
  ratingA: number;
}): number => exactQuotient([given.nominalV, given.factorMin], [given.multiple, given.ratingA], 2, "half-up");

/** The limit for a reading on cold conductors, ohms: a share of the printed one, rounded down to two decimals. */
export const coldLimitOhm = (printedOhm: number, share: number): number =>
  exactQuotient([printedOhm, share], [1], 2, "down");

/** The residual current device's limit, ohms: the touch limit over its rated residual current. */
export const rcdLimitOhm = (touchLimitV: number, ratedMa: number): number => (touchLimitV * 1000) / ratedMa;

/** Largest rated residual current that an electrode allows, milliamps. */
export const largestRcdMa = (touchLimitV: number, electrodeOhm: number): number => (touchLimitV * 1000) / electrodeOhm;

/** Longest run whose hot loop stays within a limit, metres; zero when the supply alone exceeds it. */
export const longestByLoopM = (given: {
  limitOhm: number;
  externalOhm: number;
  milliohmPerM: number;
  hotMultiplier: number;
}): number => Math.max(0, ((given.limitOhm - given.externalOhm) * 1000) / (given.milliohmPerM * given.hotMultiplier));
