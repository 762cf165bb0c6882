import type { IsoDate } from "@/lib/calc/parameter";
import type { Division } from "./bank-holidays";
import { longDate } from "./calendar";

/** Figures of the register that a firm may put its own in place of. */
export const ownFigureNames = ["noticeDays", "buriedSeparationM", "asksFirstAboveA", "assumesFuseA"] as const;
export type OwnFigureName = (typeof ownFigureNames)[number];

/** What a firm's figure rests on. */
export type Ground = {
  /** Day of the work from which it holds; null for every day. */
  from: IsoDate | null;
  /** Who told the firm, or what it read; null when it did not say. */
  source: string | null;
  /** Day on which it was set. */
  setOn: IsoDate;
};

export type Grounds = Partial<Record<OwnFigureName, Ground>>;

/** What a firm has set for an operator. Null keeps the register's rule. */
export type OperatorRules = {
  /** Days after installing for the notice, 0 for by the day of installing. */
  noticeDays: number | null;
  /** Distance the operator asks between buried electrodes, metres. */
  buriedSeparationM: number | null;
  /** Demand of a dwelling above which this operator is asked first, amps a phase. */
  asksFirstAboveA?: number | null;
  /** Fuse this operator refits cut-outs with, amps: a label alone is then no evidence. */
  assumesFuseA?: number | null;
  grounds?: Grounds;
};

/** An operator that the register lacks, as the firm has entered it. */
export type OwnOperator = {
  /** Distributor id of two digits. */
  id: string;
  name: string;
  kind: "dno" | "idno";
  /** Whose bank holidays count; null where the site decides. */
  division: Division | null;
  /** Day of the work from which the entry holds. */
  from: IsoDate;
  /** Who told the firm, or what it read. */
  source: string;
  /** Day on which it was entered. */
  setOn: IsoDate;
};

/** A firm's own settings, by distributor id (`ni` in Northern Ireland), and its own entries for ids the register lacks. */
export type FirmRules = { operators: Record<string, OperatorRules>; own?: readonly OwnOperator[] };

export const noFirmRules: FirmRules = { operators: {} };

/** Rules of an operator for which the firm has set nothing. */
export const nothingSet: OperatorRules = { noticeDays: null, buriedSeparationM: null };

/** The firm's settings for one operator on the day of the work; a figure that holds from a later day is left out. */
export function rulesFor(firm: FirmRules, operatorId: string, on: IsoDate): OperatorRules {
  const rules = firm.operators[operatorId];
  if (!rules) return nothingSet;
  const later = ownFigureNames.filter((name) => (rules.grounds?.[name]?.from ?? on) > on);
  return { ...rules, ...Object.fromEntries(later.map((name) => [name, null])) };
}

/** A firm's figure, with the words that stand beside it wherever it is used. */
export type OwnFigure = { value: number; said: string };

const sourced = (source: string | null) => (source === null ? "" : ` (source: ${source})`);

/** "set by this firm on 1 December 2026 (source: letter of 3 March)", or null when the firm has set none. */
export function ownFigure(rules: OperatorRules, name: OwnFigureName): OwnFigure | null {
  const value = rules[name] ?? null;
  if (value === null) return null;
  const ground = rules.grounds?.[name];
  const said = ground ? `set by this firm on ${longDate(ground.setOn)}${sourced(ground.source)}` : "set by this firm";
  return { value, said };
}

/** Says that an operator is known by the firm's entry alone. */
export const ownEntryWords = ({ id, setOn, source }: OwnOperator): string =>
  `Distributor ${id} is not in the register: this is the firm’s own entry, set on ${longDate(setOn)}${sourced(source)}.`;
