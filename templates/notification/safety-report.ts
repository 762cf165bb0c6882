import type { Reason } from "@/lib/notify/result";
import { emergencyLine } from "../cautions";
import { photosOf, siteOf, supplyNumberOf, type Papers } from "../issue";
import type { Block } from "../model";
import { outcomeLines } from "../outcomes";
import { listed, notRecorded, textOf } from "../words/facts";
import { conditionWords } from "../words/vocabulary";

const isDanger = ({ used }: Reason) => used.leadsTo === "stop";

/** What the operator needs at once: where it is, what was seen, who to ring. Nothing that would delay it. */
export function safetyReport(papers: Papers): Block[] {
  const { job, issue, assessment } = papers;
  const { supply, site, firm, customer } = job;
  const number = supplyNumberOf(job);
  const line = emergencyLine(site.territory);
  return [
    {
      kind: "caution",
      title: `Ring ${line} first`,
      text: "This report follows the call; it does not replace it. Fire, smoke or burning: everyone out, then 999. Nobody touches the cut-out. The operator sets the category of the fault.",
    },
    { kind: "heading", level: 1, text: "Where" },
    {
      kind: "facts",
      rows: [
        { label: "Supply number", value: [{ text: number ?? notRecorded, mono: true }] },
        { label: "Site", value: siteOf(job) },
        { label: "Customer", value: `${textOf(customer.name)}, ${textOf(customer.phone)}` },
        { label: "Reported by", value: `${textOf(firm.name)}, ${textOf(firm.phone)}, ${textOf(firm.email)}` },
        { label: "Installer's reference", value: job.jobNumber },
      ],
    },
    { kind: "heading", level: 1, text: "What was found" },
    ...outcomeLines(assessment.route.reasons.filter(isDanger)),
    {
      kind: "facts",
      rows: [
        {
          label: "Service equipment",
          value: supply.serviceConditions
            ? listed(supply.serviceConditions.map((each) => conditionWords[each]))
            : notRecorded,
        },
        {
          label: "Photos",
          value: photosOf(issue, ["damage", "cut-out", "service-head", "intake"]) ?? "none in this pack",
        },
        ...(job.notes ? [{ label: "Notes", value: job.notes }] : []),
      ],
    },
    { kind: "heading", level: 1, text: "What has to happen, in this order" },
    {
      kind: "list",
      ordered: true,
      items: [
        "Make safe: load off, touch nothing. Covers and seals stay as found, people are kept back.",
        "Do not energise the new work. It stays off and labelled until the operator has attended and a competent person clears it.",
        `Ring ${line} with the supply number and the address.`,
        "Tell the customer before leaving: nobody touches the cut-out or turns the chargepoint on.",
        "Send this report and write down the operator's reference.",
      ],
    },
  ];
}
