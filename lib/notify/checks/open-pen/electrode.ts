import { fixed, plain } from "@/lib/calc/exact";
import {
  electrodeMaxConstantCurrentOhm,
  electrodeMaxConstantPowerOhm,
  electrodeMaxOhm,
  electrodeTouchV,
} from "@/lib/calc/open-pen/single-phase";
import { openPenElectrodeMaxOhm, openPenV } from "@/lib/calc/open-pen/three-phase";
import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { touchLimitV } from "@/lib/calc/parameters/open-pen";
import { nominalVoltageV, voltageFactorMax } from "@/lib/calc/parameters/voltage";
import { knownNumber } from "@/lib/notify/job/facts";
import { absent, supplyEarthing } from "../facts";
import { cannotTell, met, notMet, rule } from "../rule";
import type { Finding, MethodRule, OpenPenCase } from "./finding";

const about = rule({
  id: "open-pen.installation-electrode",
  group: "open-pen",
  title: "Open PEN: touch voltage with the installation electrode",
  reads: [
    "chargepoints[].openPen.electrodeOhm",
    "chargepoints[].openPen.worstLoadsA",
    "demand",
    "supply.cutOutRatingA",
    "supply.earthing",
    "supply.phases",
  ],
  sources: ["BS 7671 722.411.4.1", "Circuit theory"],
  gives: ["met", "not-met", "cannot-tell"],
});

type Physics = { sourceV: number; nominalV: number; limitV: number };

const physicsOn = (on: IsoDate): Physics => {
  const nominalV = valueAt(nominalVoltageV, on);
  return { nominalV, sourceV: nominalV * valueAt(voltageFactorMax, on), limitV: valueAt(touchLimitV, on) };
};

/** The states of a three-phase installation, where they are recorded. */
function byStates({ job, unit, on }: OpenPenCase, electrodeOhm: number | null): Finding | null {
  const states = unit.openPen.worstLoadsA ?? [];
  if (job.supply.phases !== 3 || states.length === 0) return null;
  const { sourceV, nominalV, limitV } = physicsOn(on);
  const maxima = states.map((state) => openPenElectrodeMaxOhm(sourceV, nominalV, state, limitV));
  const needed = maxima.filter((ohm) => ohm !== null);
  const maxOhm = needed.length ? Math.min(...needed) : null;
  const touchV =
    electrodeOhm === null ? null : Math.max(...states.map((state) => openPenV(sourceV, nominalV, state, electrodeOhm)));
  const workings = states.map(
    (state, index) =>
      `State ${index + 1}, ${state.map(plain).join(" / ")} A: ${maxima[index] == null ? "no electrode needed" : `RA ≤ ${fixed(maxima[index], 2)} Ω`}`,
  );
  return verdict({ electrodeOhm, maxOhm, touchV, limitV, basis: "the worst state given", workings, cautionOhm: null });
}

/** One phase, at the un-curtailed demand or else the service fuse. */
function byCurrent({ job, on, unlimitedA }: OpenPenCase, electrodeOhm: number | null): Finding {
  const demandA = unlimitedA();
  const fuseA = knownNumber(job.supply.cutOutRatingA);
  const currentA = demandA ?? fuseA;
  if (currentA === null || currentA === 0)
    return {
      answer: cannotTell(
        "Neither the demand after the work nor the service fuse is known, so no electrode can be judged.",
      ),
    };
  const { sourceV, nominalV, limitV } = physicsOn(on);
  const maxOhm = electrodeMaxOhm({ sourceV, nominalV }, currentA, limitV);
  const constantOhm = electrodeMaxConstantCurrentOhm(currentA, limitV);
  const touchV = electrodeOhm === null ? null : electrodeTouchV({ sourceV, nominalV }, currentA, electrodeOhm);
  const basis =
    demandA === null
      ? `the ${plain(currentA)} A of the service fuse`
      : `${plain(currentA)} A of demand without any limit`;
  const workings = [
    `I = ${plain(currentA)} A, ${demandA === null ? "the service fuse" : "demand after the work at rated current, no limit counted"}`,
    `RA ≤ ${limitV} × ${nominalV} ÷ (${plain(currentA)} × (${fixed(sourceV, 0)} − ${limitV})) = ${fixed(maxOhm, 2)} Ω`,
    `If the load holds its current: ${limitV} ÷ ${plain(currentA)} = ${fixed(constantOhm, 2)} Ω; if it holds its power: ${fixed(electrodeMaxConstantPowerOhm(sourceV, nominalV * currentA, limitV), 2)} Ω`,
    ...(electrodeOhm === null || touchV === null
      ? []
      : [
          `U = ${fixed(sourceV, 0)} × ${plain(electrodeOhm)} ÷ (${plain(electrodeOhm)} + ${nominalV} ÷ ${plain(currentA)}) = ${fixed(touchV, 1)} V`,
        ]),
  ];
  return verdict({ electrodeOhm, maxOhm, touchV, limitV, basis, workings, cautionOhm: constantOhm });
}

function verdict(given: {
  electrodeOhm: number | null;
  maxOhm: number | null;
  touchV: number | null;
  limitV: number;
  basis: string;
  workings: readonly string[];
  cautionOhm: number | null;
}): Finding {
  const { electrodeOhm, maxOhm, touchV, limitV, basis, workings, cautionOhm } = given;
  const limit = maxOhm === null ? "no electrode needed" : `≤ ${fixed(maxOhm, 2)} Ω`;
  const figures = { touchVoltageV: touchV, electrodeMaxOhm: maxOhm };
  if (electrodeOhm === null || touchV === null)
    return {
      ...figures,
      answer: cannotTell(`The resistance of the electrode is not known; at ${basis} it has to be ${limit}.`, {
        limit,
        workings,
      }),
    };
  const rest = {
    used: { electrodeOhm, maxOhm, touchV },
    recorded: `${plain(electrodeOhm)} Ω, ${fixed(touchV, 1)} V`,
    limit,
    workings,
  };
  const reading = `At ${basis} an electrode of ${plain(electrodeOhm)} Ω leaves ${fixed(touchV, 1)} V`;
  if (maxOhm !== null && electrodeOhm > maxOhm)
    return { ...figures, answer: notMet(`${reading}, above ${limitV} V; it has to be ${limit}.`, rest) };
  const near = cautionOhm !== null && electrodeOhm > cautionOhm;
  const caution = near
    ? `A vehicle charger nearly holds its current, and then ${fixed(cautionOhm, 2)} Ω is the most: the reading lies between the two limits.`
    : null;
  return {
    ...figures,
    residualRisk: `${caution === null ? "" : `${caution} `}The sum takes this installation alone on the broken section; loads of neighbours would add to it.`,
    answer: met(`${reading}, not above ${limitV} V.${caution === null ? "" : ` ${caution}`}`, rest),
  };
}

/** An electrode joined to the main earthing terminal, low enough for the whole load to return through it. */
export const installationElectrode: MethodRule = {
  about,
  find: (given) => {
    const earthing = supplyEarthing(given.job);
    if (earthing === "TT")
      return { answer: notMet("The method is an electrode against an open PEN, but the supply is recorded as TT.") };
    if (earthing === null)
      return { answer: cannotTell(`The earthing of the supply ${absent(given.job.supply.earthing)}.`) };
    const electrodeOhm = knownNumber(given.unit.openPen.electrodeOhm);
    return byStates(given, electrodeOhm) ?? byCurrent(given, electrodeOhm);
  },
};
