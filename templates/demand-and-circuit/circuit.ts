import { longDate } from "@/lib/notify/calendar";
import type { CircuitResult } from "@/lib/notify/assessment";
import type { Circuit } from "@/lib/notify/job";
import type { Papers } from "../issue";
import type { Block } from "../model";
import { checksTable, gravestFirst, workingsOf } from "../outcomes";
import { cableName, deviceName, rcdName, unitName } from "../words/equipment";
import { amountOf, notRecorded, yesNo } from "../words/facts";
import { cpcKindWords, groupingWords, rcdPlaceWords, rcdTypeWords } from "../words/vocabulary";

/** One circuit: as designed, as worked out, as measured, its checks and their workings. */
export function circuitBlocks({ job, assessment }: Papers, circuit: Circuit): Block[] {
  const result = assessment.circuits.find(({ id }) => id === circuit.id);
  const checks = gravestFirst(assessment.checks.filter(({ group, of }) => group === "circuit" && of === circuit.id));
  const units = job.chargepoints.filter((unit) => unit.circuit === circuit.id).map(unitName);
  const purpose = units.length ? `to ${units.join(", ")}` : circuit.kind === "distribution" ? "distribution" : "final";
  return [
    { kind: "heading", level: 2, text: `Circuit ${circuit.id}, ${purpose}` },
    circuitFacts(circuit),
    ...(result ? [resultFacts(result)] : []),
    measuredFacts(circuit),
    ...checksTable(`Checks of circuit ${circuit.id}.`, checks),
    ...workingsOf(checks, result?.workings),
    ...(result?.workings.length
      ? [{ kind: "workings", title: `Workings of circuit ${circuit.id}`, lines: result.workings } as const]
      : []),
  ];
}

function circuitFacts({ device, upstreamRcds, cable, board, fedFrom, isolator }: Circuit): Block {
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      { label: "Board", value: `${board ?? notRecorded}${fedFrom ? `, fed from ${fedFrom}` : ""}` },
      { label: "Device", value: `${deviceName(device)}, ${amountOf(device.breakingCapacityKa, "kA")}` },
      { label: "RCD", value: `${rcdName(device)}, ${device.rcdPlace ? rcdPlaceWords[device.rcdPlace] : notRecorded}` },
      { label: "Switches neutral too", value: yesNo(device.doublePole) },
      {
        label: "Power both ways",
        value: yesNo(device.bidirectional, "device suited to it", "device not suited to it"),
      },
      {
        label: "RCDs before it",
        value:
          upstreamRcds === null
            ? notRecorded
            : upstreamRcds.length === 0
              ? "none"
              : upstreamRcds
                  .map(
                    ({ type, ratedMa, delayed }) =>
                      `${amountOf(ratedMa, "mA")} ${type ? rcdTypeWords[type] : "type not recorded"}${delayed === true ? ", delayed" : ""}`,
                  )
                  .join("; "),
      },
      { label: "Cable", value: [{ text: cableName(cable), mono: true }] },
      { label: "Protective conductor", value: cable.cpcKind ? cpcKindWords[cable.cpcKind] : notRecorded },
      {
        label: "Laid",
        value: `method ${cable.referenceMethod ?? notRecorded}, table ${cable.table ?? notRecorded}, ${cable.grouping ? groupingWords[cable.grouping] : "grouping not recorded"}`,
      },
      { label: "Ambient", value: [{ text: amountOf(cable.ambientC ?? cable.groundC, "°C"), mono: true }] },
      { label: "Isolator", value: yesNo(isolator) },
    ],
  };
}

function resultFacts(result: CircuitResult): Block {
  const rows = [
    { label: "Carries, Iz", value: result.iz, unit: "A", decimals: 1 },
    { label: "Voltage drop", value: result.voltDropV, unit: "V", decimals: 2 },
    { label: "Voltage drop", value: result.voltDropPercent, unit: "%", decimals: 2 },
    { label: "Zs, calculated hot", value: result.zsCalculatedOhm, unit: "Ω", decimals: 2 },
    { label: "Zs limit, hot", value: result.zsLimitHotOhm, unit: "Ω", decimals: 2 },
    { label: "Zs limit, measured cold", value: result.zsLimitColdOhm, unit: "Ω", decimals: 2 },
    { label: "Zs limit, RCD", value: result.zsLimitRcdOhm, unit: "Ω", decimals: 0 },
  ];
  return {
    kind: "facts",
    pairs: 2,
    rows: rows.map(({ label, value, unit, decimals }) => ({
      label,
      value: [{ text: value === null ? "cannot tell" : amountOf(value, unit, decimals), mono: true }],
    })),
  };
}

function measuredFacts({ measured }: Circuit): Block {
  const multiple = measured.rcdTestMultiple === null ? "" : ` at ${measured.rcdTestMultiple} times`;
  return {
    kind: "facts",
    pairs: 2,
    rows: [
      { label: "Tested", value: measured.testedOn ? longDate(measured.testedOn) : notRecorded },
      { label: "R1 + R2", value: [{ text: amountOf(measured.r1r2Ohm, "Ω"), mono: true }] },
      { label: "Zs, measured", value: [{ text: amountOf(measured.zsOhm, "Ω"), mono: true }] },
      { label: "RCD opens in", value: [{ text: `${amountOf(measured.rcdTripMs, "ms")}${multiple}`, mono: true }] },
      { label: "Opens at d.c.", value: [{ text: amountOf(measured.dcTripMa, "mA"), mono: true }] },
      {
        label: "Insulation",
        value: [
          {
            text: `${amountOf(measured.insulationMohm, "MΩ")}${measured.insulationTestV === null ? "" : ` at ${measured.insulationTestV} V`}`,
            mono: true,
          },
        ],
      },
      { label: "Polarity", value: yesNo(measured.polarityCorrect, "correct", "not correct") },
      { label: "Phase sequence", value: yesNo(measured.phaseSequenceCorrect, "correct", "not correct") },
    ],
  };
}
