import type { IsoDate } from "@/lib/calc/parameter";
import { ownFigure, ownFigureNames, type OperatorRules, type OwnFigureName } from "../firm-rules";
import { isLooser, registerFigure } from "../register-figures";
import { rule } from "../rule";
import { finding, type Finding } from "./finding";

/** A firm's figure may tighten. One that loosens is used, and is said on the cover. */
export const firmFigure = rule({
  id: "route.firm-figure",
  group: "route",
  title: "The firm’s own figure not looser than the register’s",
  reads: ["site.supplyNumber"],
  sources: ["our-practice"],
  outcomes: ["met", "not-met"],
});

const figureWords: Record<OwnFigureName, (value: number) => string> = {
  noticeDays: (value) => `allows ${value} day${value === 1 ? "" : "s"} for the notice`,
  buriedSeparationM: (value) => `keeps ${value} m between buried metalwork and an electrode`,
  asksFirstAboveA: (value) => `asks first above ${value} A a phase at a dwelling`,
  assumesFuseA: (value) => `expects a fuse of ${value} A whatever the label says`,
};

/** One answer for each figure that the firm has set and that holds on the day of the work. */
export const firmFigureFindings = (operatorId: string, rules: OperatorRules, on: IsoDate): Finding[] =>
  ownFigureNames.flatMap((name) => {
    const own = ownFigure(rules, name);
    if (!own) return [];
    const register = registerFigure(name, operatorId, on);
    const words = `This firm ${figureWords[name](own.value)}, ${own.said}, where the register has ${register.words}.`;
    const detail = { used: { figure: name, register: register.value, firm: own.value } };
    return [
      isLooser(name, own.value, operatorId, on)
        ? finding(firmFigure.says("not-met", `${words} The firm answers for the difference.`, detail), "none")
        : finding(firmFigure.says("met", words, detail), "none"),
    ];
  });
