import type { Job } from "@/lib/notify/job";
import { isolatorWords } from "../../words/equipment";
import { amountOf, listed } from "../../words/facts";
import { cutOutEvidenceWords, earthingWords } from "../../words/vocabulary";
import { box, dot, inksOf, label, line, path, type Surface } from "../svg";
import { fitted, wrapped } from "../text-width";
import { column } from "./measures";
import { switchSymbol } from "./symbols";
import { electrodeSymbol } from "./unit";

/** Level at which the tails leave the intake, and that of the main earthing terminal. */
export const levels = { tails: 218, terminal: 268 } as const;

type Intake = Pick<Job, "supply" | "chargepoints">;

const hasElectrode = ({ supply, chargepoints }: Intake) =>
  supply.earthing === "TT" || chargepoints.some(({ openPen }) => openPen.method === "installation-electrode");

const terminalRoom = column.intakeRight - 48;

const bondingLines = ({ supply: { bonding } }: Intake): string[] => {
  const words =
    bonding === null
      ? "bonding not recorded"
      : bonding.length === 0
        ? "bonding: none found"
        : `bonding: ${listed(bonding.map(({ service, mm2 }) => `${service} ${amountOf(mm2, "mm²")}`))}`;
  return wrapped(words, 10, terminalRoom, 3);
};

/** Height the intake needs below the upper edge of the sheet. */
export const intakeHeight = (job: Intake): number =>
  hasElectrode(job) ? levels.terminal + 82 : levels.terminal + 28 + bondingLines(job).length * 12;

/** Service, cut-out, meter, isolator and main earthing terminal, down the left of the sheet. */
export function intakeMarks({ supply, chargepoints }: Intake, operatorName: string, surface: Surface): string {
  const inks = inksOf[surface];
  const wire = column.intake;
  const beside = wire + 30;
  const room = column.intakeRight - beside;
  const strong = (x: number, y: number, text: string, most: number) =>
    label(x, y, fitted(text, 10.5, most, true), { size: 10.5, strong: true, colour: inks.ink });
  const quiet = (x: number, y: number, text: string, most: number) =>
    label(x, y, fitted(text, 10, most), { size: 10, colour: inks.quiet });
  const phases =
    supply.phases === null
      ? "phases not recorded"
      : supply.phases === 1
        ? "1 phase"
        : supply.phases === 2
          ? "split phase"
          : "3 phases";
  const earthing =
    supply.earthing === null
      ? "earthing not recorded"
      : supply.earthing === "unknown"
        ? "earthing not known"
        : earthingWords[supply.earthing];
  const metered = supply.metered === false ? "unmetered" : "kWh";
  return (
    strong(2, 13, operatorName, column.intakeRight) +
    quiet(2, 27, `${earthing}, ${phases}`, column.intakeRight) +
    box(4, 38, column.intakeRight - 8, 128, { dash: "5 4", width: 1.2, colour: inks.ink }) +
    // The service comes from the ground, thick, into the cut-out.
    path(`M16 ${166}V76H${wire - 20}`, { width: 4, colour: inks.ink }) +
    box(wire - 20, 66, 40, 20, { colour: inks.ink, fill: inks.paper }) +
    line(wire - 20, 76, wire + 20, 76, { colour: inks.ink }) +
    strong(beside, 66, `${amountOf(supply.cutOutRatingA, "A")}`, room) +
    wrapped(
      supply.cutOutEvidence ? cutOutEvidenceWords[supply.cutOutEvidence] : "rating evidence not recorded",
      10,
      room,
      3,
    )
      .map((text, row) => quiet(beside, 79 + row * 12, text, room))
      .join("") +
    path(`M${wire + 20} 76H${wire + 24}V102H${wire}V118`, { colour: inks.ink }) +
    box(wire - 20, 118, 40, 28, { colour: inks.ink, fill: inks.paper }) +
    label(wire, 136, metered === "kWh" ? "kWh" : "none", {
      size: 10,
      strong: true,
      anchor: "middle",
      colour: inks.ink,
    }) +
    (metered === "kWh" ? "" : quiet(beside, 136, "unmetered", room)) +
    line(wire, 146, wire, 180, { colour: inks.ink }) +
    (supply.isolatorAfterMeter === "yes"
      ? `<g transform="translate(${wire} 180) rotate(90)">${switchSymbol(0, 0, inks.ink)}</g>` +
        line(wire, 199, wire, levels.tails, { colour: inks.ink })
      : line(wire, 180, wire, levels.tails, { colour: inks.ink })) +
    wrapped(isolatorWords(supply.isolatorAfterMeter), 10, room, 2)
      .map((text, row) => quiet(beside, 182 + row * 12, text, room))
      .join("") +
    line(wire, levels.tails, column.tails, levels.tails, { colour: inks.ink }) +
    quiet(beside, levels.tails - 5, `tails ${amountOf(supply.tailsMm2, "mm²")}`, room) +
    earthMarks({ supply, chargepoints }, surface)
  );
}

function earthMarks({ supply, chargepoints }: Intake, surface: Surface): string {
  const inks = inksOf[surface];
  const y = levels.terminal;
  const electrode = chargepoints.find(({ openPen }) => openPen.method === "installation-electrode");
  const fromNetwork = supply.earthing === "TN-C-S" || supply.earthing === "TN-S";
  const right = column.intakeRight - 4;
  return (
    line(28, y, right, y, { width: 4, colour: inks.ink }) +
    label(44, y + 16, "Main earthing terminal", { size: 10.5, strong: true, colour: inks.ink }) +
    label(44, y - 9, fitted(`earthing ${amountOf(supply.earthingConductorMm2, "mm²")}`, 10, right - 44), {
      size: 10,
      colour: inks.quiet,
    }) +
    bondingLines({ supply, chargepoints })
      .map((text, row) => label(44, y + 30 + row * 12, text, { size: 10, colour: inks.quiet }))
      .join("") +
    (fromNetwork
      ? path(`M16 96H28V${y}`, { dash: "7 3 2 3", colour: inks.ink }) +
        dot(16, 96, 2.6, { fill: inks.ink, colour: inks.ink })
      : "") +
    (hasElectrode({ supply, chargepoints })
      ? electrodeSymbol(28, y, 58, inks.ink) +
        label(
          44,
          y + 70,
          fitted(electrodeWords(electrode?.openPen.electrodeOhm, supply.earthing === "TT"), 10, right - 44),
          { size: 10, colour: inks.ink },
        )
      : "")
  );
}

const electrodeWords = (ohm: Parameters<typeof amountOf>[0], tt: boolean): string =>
  ohm === undefined && tt ? "earth electrode" : `electrode ${amountOf(ohm, "Ω")}`;
