import type { Job } from "./job";
import { operatorEntry } from "./operator-register";

export type Territory = NonNullable<Job["site"]["territory"]>;

export type SupplyNumber = {
  kind: "mpan" | "mprn";
  /** The 13 digits of the core in Great Britain, the 11 digits in Northern Ireland. */
  core: string;
  /** As it is read aloud: "23 9923 2323 236". */
  printed: string;
  /** Distributor id of two digits, `ni` in Northern Ireland. */
  operatorId: string;
  /** What a second person should look at. Never empty: no digit protects the last two digits of a core. */
  cautions: string[];
};

export type SupplyNumberReading = ({ ok: true } & SupplyNumber) | { ok: false; message: string };

/** Twelve primes from 3 to 43 without 11: weights of the check digit, in the order of the digits. */
const weights = [3, 5, 7, 13, 17, 19, 23, 29, 31, 37, 41, 43] as const;
const coreLength = 13;
const wholeLengths = [21, 22];
const northernIrelandLength = 11;

/** The thirteenth digit that the first twelve call for: the weighted sum modulo 11, then modulo 10. */
export function checkDigit(firstTwelve: string): number {
  const sum = weights.reduce((total, weight, index) => total + weight * Number(firstTwelve[index]), 0);
  return (sum % 11) % 10;
}

const refused = (message: string): SupplyNumberReading => ({ ok: false, message });

/**
 * Reads a supply number as typed or pasted: spaces, hyphens, line breaks and a leading S are taken out;
 * of a whole number of 21 or 22 characters the last 13 are the core, and the top line decides nothing.
 * Returns the core with its cautions, or a sentence with the remedy. Nothing is thrown.
 */
export function parseSupplyNumber(text: string, territory: Territory | null): SupplyNumberReading {
  const typed = text
    .replace(/[\s\-–]/g, "")
    .replace(/^s/i, "")
    .toUpperCase();
  if (territory === "northern-ireland") return parseNorthernIreland(typed);
  if (/^81\d{9}$/.test(typed))
    return refused(
      "This is a supply number of Northern Ireland (11 digits from 81). Check the territory, or type the 13 digits from the bill.",
    );
  if (/^\d{6,10}$/.test(typed))
    return refused("This is too short, and may be a gas number. The electricity supply number has 13 digits.");
  const core =
    typed.length === coreLength ? typed : wholeLengths.includes(typed.length) ? typed.slice(-coreLength) : "";
  if (core === "")
    return refused(
      `This has ${typed.length} characters. Type the 13 digits of the bottom line, or the whole number of 21 characters.`,
    );
  if (!/^\d{13}$/.test(core)) return refused("The last 13 characters must all be digits. Read the bottom line again.");
  return parseCore(core);
}

function parseNorthernIreland(typed: string): SupplyNumberReading {
  if (!/^81\d*$/.test(typed) || typed.length !== northernIrelandLength)
    return refused("Northern Ireland has supply numbers of 11 digits that begin with 81. Read the bill again.");
  return {
    ok: true,
    kind: "mprn",
    core: typed,
    printed: `${typed.slice(0, 2)} ${typed.slice(2, 5)} ${typed.slice(5, 8)} ${typed.slice(8)}`,
    operatorId: "ni",
    cautions: ["A Northern Ireland number has no check digit. Compare all 11 digits with the bill."],
  };
}

/** What is said of a distributor that the register does not hold. */
export const notInRegister = (operatorId: string): string =>
  `Distributor ${operatorId} is not in the register. Check the first two digits; if they are right, find out who runs the network.`;

function parseCore(core: string): SupplyNumberReading {
  const operatorId = core.slice(0, 2);
  if (operatorId === "00")
    return refused("No distributor has the number 00. Read the first two digits of the bottom line again.");
  const wanted = checkDigit(core);
  if (wanted !== Number(core.at(-1)))
    return refused(
      `The last digit does not fit the twelve before it: ${wanted} was expected. One digit is wrong or two are swapped; read the bill again.`,
    );
  const cautions = [
    "The check digit cannot tell when the last two digits are swapped. Compare them with the bill, or keep a photo of it.",
  ];
  if (!operatorEntry(operatorId)) cautions.push(notInRegister(operatorId));
  return {
    ok: true,
    kind: "mpan",
    core,
    printed: `${core.slice(0, 2)} ${core.slice(2, 6)} ${core.slice(6, 10)} ${core.slice(10)}`,
    operatorId,
    cautions,
  };
}
