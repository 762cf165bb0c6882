import type { Group } from "./model";
import { surge } from "./words";

/** The boards that feed the circuits. They are asked with the circuits, after them. */
export const board: readonly Group[] = [
  {
    subject: "circuit",
    title: "Board",
    lead: "The consumer unit that feeds the circuit.",
    each: "boards",
    questions: [
      {
        path: "arrangement",
        label: "The board is",
        short: "Board",
        kind: "choice",
        columns: 3,
        options: [
          { value: "existing", word: "Existing" },
          { value: "additional", word: "Added" },
          { value: "replaced", word: "Replaced" },
        ],
      },
      {
        path: "reason",
        label: "Why a new board",
        short: "Why",
        kind: "choice",
        options: [
          { value: "existing-full", word: "Old one full" },
          { value: "existing-unsuitable", word: "Old one unsuitable" },
          { value: "customer-choice", word: "Customer’s choice" },
          { value: "none", word: "No reason given" },
        ],
        applies: (job, index) => job.boards[index]?.arrangement !== "existing",
      },
      {
        path: "surgeProtection",
        label: "Surge protection",
        short: "Surge",
        kind: "choice",
        columns: 1,
        options: surge,
        notKnown: { rule: "The surge check cannot tell.", then: "Look for it in the board." },
      },
      {
        path: "assemblyRatingA",
        label: "Rating of the board",
        short: "Board rating",
        kind: "number",
        unit: "A",
        usual: [63, 100],
        notKnown: { rule: "The board check cannot tell.", then: "Read the label on the board." },
      },
      {
        path: "conditionalFaultRatingKa",
        label: "Conditional fault rating",
        short: "Fault rating",
        kind: "number",
        unit: "kA",
        notKnown: { rule: "The fault-rating check cannot tell.", then: "Read the label on the board." },
      },
    ],
  },
  {
    subject: "circuit",
    title: "Ways in the board",
    each: "boards",
    more: () => true,
    questions: [
      { path: "ways", label: "Ways, in modules", short: "Ways", kind: "number", unit: "no.", whole: true },
      {
        path: "modules.mainSwitch",
        label: "Taken by the main switch",
        short: "Main switch",
        kind: "number",
        unit: "no.",
        whole: true,
      },
      {
        path: "modules.surgeProtection",
        label: "Taken by surge protection",
        short: "Surge",
        kind: "number",
        unit: "no.",
        whole: true,
      },
      {
        path: "modules.circuitProtection",
        label: "Taken by circuit devices",
        short: "Devices",
        kind: "number",
        unit: "no.",
        whole: true,
      },
      {
        path: "modules.other",
        label: "Taken by anything else",
        short: "Other",
        kind: "number",
        unit: "no.",
        whole: true,
      },
    ],
  },
];
