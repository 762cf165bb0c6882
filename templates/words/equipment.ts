import type { Chargepoint, Circuit, Job } from "@/lib/notify/job";
import { absence, amountOf, notRecorded, number } from "./facts";
import { rcdTypeWords } from "./vocabulary";

/** "Kestrel Dock 7", or the unit's id where the plate was not recorded. */
export const unitName = ({ id, make, model }: Pick<Chargepoint, "id" | "make" | "model">): string =>
  [make, model].filter(Boolean).join(" ") || `Chargepoint ${id}`;

/** "32 A, 1 phase, L1". */
export const unitRating = ({ ratedA, phases, phase }: Chargepoint): string =>
  [
    amountOf(ratedA, "A"),
    phases === null ? "phases not recorded" : phases === 1 ? "1 phase" : `${phases} phases`,
    phase,
  ]
    .filter(Boolean)
    .join(", ");

/** "B40 RCBO", "100 A BS88-3", with "not recorded" for what is missing. */
export function deviceName({ kind, curve, ratingA }: Circuit["device"]): string {
  if (kind === null && ratingA === null) return "device not recorded";
  if (curve !== null && ratingA !== null) return `${curve}${number(ratingA)} ${kind ?? "device"}`;
  return `${amountOf(ratingA, "A")} ${kind ?? "device"}`;
}

/** "30 mA type A", "no RCD", or that it was not recorded. */
export function rcdName({ rcdType, rcdMa, rcdPlace }: Circuit["device"]): string {
  if (rcdType === "none" || rcdPlace === "none") return "no RCD";
  if (rcdType === null && rcdMa === null) return "RCD not recorded";
  const type = rcdType === null ? "type not recorded" : rcdTypeWords[rcdType];
  return `${amountOf(rcdMa, "mA")} ${type}`;
}

/** "6/2.5 mm²", with what stands for the protective conductor where it has no size. */
export function cableSize({ lineMm2, cpcMm2, cpcKind }: Circuit["cable"]): string {
  const line = lineMm2 === null ? "size not recorded" : `${number(lineMm2)} mm²`;
  if (typeof cpcMm2 === "number" && lineMm2 !== null) return `${number(lineMm2)}/${number(cpcMm2)} mm²`;
  if (typeof cpcMm2 === "number") return `${line}, cpc ${number(cpcMm2)} mm²`;
  return cpcKind === "armour" ? `${line}, armour as cpc` : `${line}, cpc ${absence(cpcMm2) ?? notRecorded}`;
}

/** "18 m", or that the length is not known. */
export const cableLength = ({ lengthM }: Circuit["cable"]): string =>
  absence(lengthM) === null ? amountOf(lengthM, "m") : `length ${amountOf(lengthM, "m")}`;

/** "6/2.5 mm², 18 m". */
export const cableName = (cable: Circuit["cable"]): string => `${cableSize(cable)}, ${cableLength(cable)}`;

/** Whether there is an isolator between the meter and the boards, for a drawing. */
export const isolatorWords = (answer: Job["supply"]["isolatorAfterMeter"]): string =>
  answer === "yes"
    ? "isolator"
    : answer === "no"
      ? "no isolator"
      : answer === "unknown"
        ? "isolator not known"
        : "isolator not recorded";
