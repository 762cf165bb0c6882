import type { DocumentModel } from "@/templates/model";

const square =
  '<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 200 100" width="200" height="100" font-family="Instrument Sans"><rect x="10" y="10" width="180" height="80" fill="none" stroke="#1b211e"/><text x="20" y="55" font-size="14">0.21 Ω, 6 mm²</text></svg>';

/** One document that holds every kind of block in every form it can take. */
export const everyBlock: DocumentModel = {
  slug: "09-every-block",
  title: "Every block",
  subtitle: "To Northern Powergrid. One of each, so that each renderer meets it.",
  firmName: "Fenwold Electrical Ltd",
  jobNumber: "FEN-0147",
  version: 2,
  issuedAt: "2026-12-01T09:00:00Z",
  ruleset: "2026-12-01.1",
  blocks: [
    { kind: "heading", level: 1, text: "Premises and people" },
    { kind: "paragraph", text: "A plain paragraph with ohms Ω, at most ≤ and square millimetres mm²." },
    {
      kind: "facts",
      rows: [
        { label: "Supply number", value: [{ text: "23 9923 2323 236", mono: true }, { text: " (import)" }] },
        { label: "Site", value: "4 Ropewalk Lane, Oxcombe, XA3 4EF. Domestic, existing connection." },
      ],
    },
    {
      kind: "facts",
      pairs: 2,
      rows: [
        { label: "Cut-out", value: [{ text: "100 A", mono: true }, { text: ", carrier label" }] },
        { label: "Phases", value: "1, metered" },
        { label: "Notes", value: "A long value takes a whole row because it would not fit beside another one." },
        { label: "Earthing", value: "TN-C-S" },
      ],
    },
    { kind: "heading", level: 2, text: "A table" },
    {
      kind: "table",
      caption: "Table 1. Checks of the circuit.",
      columns: [
        { heading: "Outcome", widthPercent: 20 },
        { heading: "Check", widthPercent: 45 },
        { heading: "Recorded", widthPercent: 17, align: "right", mono: true },
        { heading: "Limit", widthPercent: 18, align: "right", mono: true },
      ],
      rows: [
        [[{ text: "Met", strong: true, mark: "met" }], "Voltage drop to the chargepoint", "4.20 V", "≤ 11.5 V"],
        [[{ text: "Cannot tell", strong: true, mark: "cannot-tell" }], "Earth fault loop", "not recorded", "≤ 1.09 Ω"],
      ],
    },
    { kind: "list", ordered: false, items: ["First point", [{ text: "Second", strong: true }, { text: " point" }]] },
    { kind: "list", ordered: true, items: ["First step", "Second step"] },
    { kind: "list", ordered: true, items: ["Another first step"] },
    { kind: "outcome", outcome: "met", title: "Demand", because: "56.8 A is not above 60 A.", sources: ["ENA form"] },
    { kind: "outcome", outcome: "not-met", title: "Loop", because: "The service is looped.", sources: [] },
    { kind: "outcome", outcome: "cannot-tell", title: "Method", because: "The method was not recorded.", sources: [] },
    { kind: "outcome", outcome: "not-applicable", title: "Generation", because: "It cannot export.", sources: ["G99"] },
    { kind: "workings", title: "Voltage drop", lines: ["Vd = 7.3 x 32 x 18 / 1000 = 4.20 V", "4.20 / 230 = 1.83 %"] },
    { kind: "caution", title: "The cut-out rating is as marked on the carrier", text: "The fuse link was not seen." },
    {
      kind: "figure",
      svg: square,
      alt: "A rectangle with a label.",
      caption: "Figure 1. A rectangle.",
      widthMm: 120,
      heightMm: 60,
    },
    { kind: "heading", level: 3, text: "Declarations" },
    { kind: "signature", role: "customer", name: null, at: null, statement: "I was shown the hours and the delay." },
    {
      kind: "signature",
      role: "competent person",
      name: "Tam Orrell",
      at: "2026-12-01T09:00:00Z",
      statement: "What is recorded here is what I saw and measured.",
    },
  ],
};
