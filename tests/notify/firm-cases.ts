import type { FirmRules, OperatorRules, OwnOperator } from "@/lib/notify/firm-rules";
import type { Changes } from "./record";

/** What a firm has set for the distributor of the worked example (23), as set on 1 December 2026. */
export const firmWith = (rules: Partial<OperatorRules>, id = "23"): FirmRules => ({
  operators: { [id]: { noticeDays: null, buriedSeparationM: null, ...rules } },
});

export const entered: OwnOperator = {
  id: "41",
  name: "Fenwold Estate Networks",
  kind: "idno",
  division: null,
  from: "2026-01-01",
  source: "the developer’s letter of 4 March",
  setOn: "2026-12-01",
};

/** Cases for the outcomes that only a firm's own figures give. */
export const firmCases: readonly { changes: Changes; firm: FirmRules }[] = [
  { changes: {}, firm: firmWith({ noticeDays: 7 }) },
  { changes: {}, firm: firmWith({ noticeDays: 40 }) },
];
