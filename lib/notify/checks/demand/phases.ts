import type { Chargepoint } from "@/lib/notify/job";

export type PhaseName = "L1" | "L2" | "L3";
const names: readonly PhaseName[] = ["L1", "L2", "L3"];

/** Which phases of a supply a single-phase item takes: its index, or null when that is not told. */
export function phaseIndex(phases: number, phase: PhaseName | null): number | null {
  if (phases === 1) return 0;
  const index = phase === null ? -1 : names.indexOf(phase);
  return index >= 0 && index < phases ? index : null;
}

/** Indexes of the phases a chargepoint takes, null when they are not told. */
export function phasesOf(unit: Chargepoint, supplyPhases: number): number[] | null {
  if (unit.phases === null) return null;
  if (unit.phases === supplyPhases) return Array.from({ length: supplyPhases }, (_, index) => index);
  if (unit.phases !== 1) return null;
  const index = phaseIndex(supplyPhases, unit.phase);
  return index === null ? null : [index];
}

/** `L1: ` before a line of workings on a polyphase supply, nothing on a single phase. */
export const phaseLabel = (phases: number, index: number): string => (phases === 1 ? "" : `${names[index]}: `);

/** No current on any phase. */
export const zeros = (phases: number): number[] => Array<number>(phases).fill(0);

/** A current added on the phases named by index. */
export const addAt = (perPhaseA: readonly number[], indexes: readonly number[], amps: number): number[] =>
  perPhaseA.map((value, index) => (indexes.includes(index) ? value + amps : value));

/** Two lists of the same length, phase by phase. */
export const sumByPhase = (a: readonly number[], b: readonly number[]): number[] =>
  a.map((amps, index) => amps + (b[index] as number));
