import { parameter } from "@/lib/calc/parameter";

const ours = { from: "2020-01-01", source: "our-practice", certainty: "derived" } as const;

/** When to ask again, in working days after sending. No operator publishes such a clock; these are this program's own. */
export const bounceCheckWorkingDays = parameter({
  id: "practice.bounce-check",
  unit: "working days",
  meaning: "Days without an acknowledgement after which the sender looks for a bounced message.",
  values: [{ ...ours, value: 2 }],
});

export const phoneWorkingDays = parameter({
  id: "practice.phone",
  unit: "working days",
  meaning: "Days without an answer after which the operator is telephoned and the name noted.",
  values: [{ ...ours, value: 5 }],
});

export const formalChaseWorkingDays = parameter({
  id: "practice.formal-chase",
  unit: "working days",
  meaning:
    "Days without a decision after which a formal chase quotes the reference; the first answer of the fast generation paths is due then.",
  values: [{ ...ours, value: 10 }],
});

export const complaintWorkingDays = parameter({
  id: "practice.complaint",
  unit: "working days",
  meaning: "Days without a decision after which the operator's complaint route is used.",
  values: [{ ...ours, value: 20 }],
});

export const answerWorkingDays = parameter({
  id: "practice.answer-question",
  unit: "working days",
  meaning: "Days within which the firm answers an operator's question.",
  values: [{ ...ours, value: 2 }],
});
