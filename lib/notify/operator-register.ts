import type { DatedValue } from "@/lib/calc/parameter";
import type { Division } from "./bank-holidays";

/** What a network operator wants that the national process does not say. */
export type OperatorTrait =
  | "notice-by-install-day"
  | "supply-table"
  | "labels-in-doubt"
  | "commercial-share"
  | "two-addresses"
  | "band-above-dwelling-limit";

export type OperatorEntry = {
  /** Distributor id, the first two digits of the supply number; `ni` for Northern Ireland. */
  id: string;
  /** Name today. */
  name: string;
  area: string;
  group: string;
  kind: "dno" | "idno" | "ni";
  /** Whose bank holidays count; null where the operator works in more than one part and the site decides. */
  division: Division | null;
  /** Day of the list the entry was taken from. */
  from: string;
  source: string;
  /** Every name with its days, oldest first. */
  names: readonly [DatedValue<string>, ...DatedValue<string>[]];
  traits: readonly OperatorTrait[];
};

const listed = { from: "2023-01-01", source: "supply-number-structure", certainty: "seen" } as const;

const dno = (
  id: string,
  area: string,
  group: string,
  name: string,
  division: Division,
  traits: readonly OperatorTrait[] = [],
): OperatorEntry => ({
  id,
  name,
  area,
  group,
  kind: "dno",
  division,
  from: listed.from,
  source: listed.source,
  names: [{ ...listed, value: name }],
  traits,
});

const formerlyWestern = (entry: OperatorEntry): OperatorEntry => ({
  ...entry,
  names: [
    {
      from: "2011-05-01",
      to: "2022-09-20",
      value: "Western Power Distribution",
      source: "nged-rename",
      certainty: "from memory: verify",
    },
    { from: "2022-09-21", value: entry.name, source: "nged-rename", certainty: "from memory: verify" },
  ],
});

const idno = (id: string, name: string, group = name): OperatorEntry => ({
  id,
  name,
  area: "within other operators’ areas",
  group,
  kind: "idno",
  division: null,
  from: listed.from,
  source: listed.source,
  names: [{ ...listed, value: name }],
  traits: [],
});

const ukpn: readonly OperatorTrait[] = ["notice-by-install-day", "supply-table"];
const nged = "National Grid Electricity Distribution";
const ew = "england-and-wales";

/** Distribution network operators of Great Britain, by distributor id. */
const distribution: readonly OperatorEntry[] = [
  dno("10", "East England", "UK Power Networks", "UK Power Networks", ew, ukpn),
  formerlyWestern(dno("11", "East Midlands", nged, nged, ew, ["labels-in-doubt"])),
  dno("12", "London", "UK Power Networks", "UK Power Networks", ew, ukpn),
  dno("13", "North Wales, Merseyside, Cheshire", "SP Energy Networks", "SP Energy Networks", ew),
  formerlyWestern(dno("14", "West Midlands", nged, nged, ew, ["labels-in-doubt"])),
  dno("15", "North East England", "Northern Powergrid", "Northern Powergrid", ew),
  dno("16", "North West England", "Electricity North West", "Electricity North West", ew, ["two-addresses"]),
  dno("17", "North Scotland", "SSEN", "SSEN", "scotland", ["commercial-share"]),
  dno("18", "South and Central Scotland", "SP Energy Networks", "SP Energy Networks", "scotland", ["commercial-share"]),
  dno("19", "South East England", "UK Power Networks", "UK Power Networks", ew, ukpn),
  dno("20", "Southern England", "SSEN", "SSEN", ew),
  formerlyWestern(dno("21", "South Wales", nged, nged, ew, ["labels-in-doubt"])),
  formerlyWestern(dno("22", "South West England", nged, nged, ew, ["labels-in-doubt"])),
  dno("23", "Yorkshire", "Northern Powergrid", "Northern Powergrid", ew),
];

/** Independent operators as listed in 2023. Later ids may be issued: an unknown id warns and never blocks. */
const independents: readonly OperatorEntry[] = [
  idno("24", "Independent Power Networks", "GTC"),
  idno("25", "ESP Electricity"),
  idno("26", "Last Mile Electricity"),
  idno("27", "The Electricity Network Company", "GTC"),
  idno("28", "UK Power Networks (out of area)"),
  idno("29", "Harlaxton Energy Networks"),
  idno("30", "Leep Electricity Networks"),
  idno("31", "UK Power Distribution"),
  idno("32", "Energy Assets Networks"),
  idno("33", "Eclipse Power Networks"),
  idno("34", "Murphy Power Distribution"),
  idno("35", "Fulcrum Electricity Assets"),
  idno("36", "Vattenfall Networks"),
  idno("37", "Optimal Power Networks"),
  idno("38", "Indigo Power"),
];

const northernIreland: OperatorEntry = {
  id: "ni",
  name: "NIE Networks",
  area: "Northern Ireland",
  group: "NIE Networks",
  kind: "ni",
  division: "northern-ireland",
  from: listed.from,
  source: "nie-lct",
  names: [{ ...listed, source: "nie-lct", value: "NIE Networks" }],
  traits: ["band-above-dwelling-limit"],
};

/** Every operator the program knows, by distributor id; Northern Ireland last. */
export const operatorRegister: readonly OperatorEntry[] = [...distribution, ...independents, northernIreland];

const byId = new Map(operatorRegister.map((entry) => [entry.id, entry]));

/** The entry of a distributor id, or undefined when the register does not hold it. */
export const operatorEntry = (id: string): OperatorEntry | undefined => byId.get(id);
