import type { OperatorRow } from "@/lib/notify/views";

export const kindWord: Record<OperatorRow["kind"], string> = {
  dno: "Distribution operator",
  idno: "Independent operator",
  ni: "Northern Ireland",
};

/** Whose bank holidays count, in words. */
export const divisionWord: Record<string, string> = {
  "england-and-wales": "England and Wales",
  scotland: "Scotland",
  "northern-ireland": "Northern Ireland",
};
