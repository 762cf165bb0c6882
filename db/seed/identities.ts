import { createHash } from "node:crypto";
import type { Role } from "@/lib/notify/roles";
import type { Viewer } from "@/lib/server/auth/viewer";

/** The same id for the same words, so that two machines seed the same demo. */
export function idOf(words: string): string {
  const hex = createHash("sha256").update(`sealwire demo: ${words}`).digest("hex");
  return [hex.slice(0, 8), hex.slice(8, 12), `4${hex.slice(13, 16)}`, `8${hex.slice(17, 20)}`, hex.slice(20, 32)].join(
    "-",
  );
}

export const demoPassword = "copper-wire-seal-7";

export type DemoFirm = {
  id: string;
  name: string;
  contactName: string;
  phone: string;
  email: string;
  address: string[];
  registration: string;
  numberPrefix: string;
  nextNumber: number;
};

export const fenwold: DemoFirm = {
  id: idOf("firm Fenwold"),
  name: "Fenwold Electrical Ltd",
  contactName: "Nia Beckwith",
  phone: "01632 960118",
  email: "jobs@fenwold.example.com",
  address: ["3 Mill Yard", "Thrale"],
  registration: "REG-10417",
  numberPrefix: "FEN",
  nextNumber: 98,
};

export const larkmoor: DemoFirm = {
  id: idOf("firm Larkmoor"),
  name: "Larkmoor Electrical Ltd",
  contactName: "Pim Lacey",
  phone: "01632 960274",
  email: "office@larkmoor.example.com",
  address: ["18 Weavers Walk", "Saltmere"],
  registration: "REG-20881",
  numberPrefix: "LRK",
  nextNumber: 31,
};

export type DemoPerson = {
  key: string;
  firm: DemoFirm;
  name: string;
  email: string;
  roles: Role[];
  registration: string | null;
};

const person = (
  key: string,
  firm: DemoFirm,
  name: string,
  domain: string,
  roles: Role[],
  registration: string | null,
) => ({
  key,
  firm,
  name,
  email: `${key}@${domain}.example.com`,
  roles,
  registration,
});

export const people: DemoPerson[] = [
  person("nia", fenwold, "Nia Beckwith", "fenwold", ["admin"], null),
  person("tam", fenwold, "Tam Orrell", "fenwold", ["installer"], "REG-10417"),
  person("edda", fenwold, "Edda Farrow", "fenwold", ["compliance"], null),
  person("sole", fenwold, "Ros Vantry", "fenwold", ["installer", "admin", "compliance"], "REG-10933"),
  person("joss", fenwold, "Joss Amery", "fenwold", ["installer"], "REG-11250"),
  person("pim", larkmoor, "Pim Lacey", "larkmoor", ["installer", "admin", "compliance"], "REG-20881"),
];

/** A person as the data layer sees them when signed in. The seed has no sessions, so it says who acts itself. */
export function viewerOf(key: string): Viewer {
  const found = people.find((each) => each.key === key);
  if (!found) throw new Error(`nobody of the demo is called ${key}`);
  const { firm, name, email, roles } = found;
  return {
    userId: idOf(`person ${key}`),
    firmId: firm.id,
    firmName: firm.name,
    name,
    email,
    roles,
  } as unknown as Viewer;
}
