import { describe, expect, it } from "vitest";
import { submissionLetter, type LetterFacts } from "@/db/submission-letter";

// Our own wording, no source. What is held to: names keep their capitals, and an answer quotes what was asked.
const facts: LetterFacts = {
  purpose: "application",
  state: "acknowledged",
  jobNumber: "FEN-0119",
  site: "The Old Bakery, Thrale",
  postcode: "XA5 1VW",
  supplyCore: null,
  unit: "Kestrel Dock 7",
  installedOn: null,
  plannedOn: "2026-12-15",
  sentOn: "2026-11-13",
  reference: "NW-50722",
  workingDaysSinceSent: 12,
  packVersion: 1,
  question: null,
  firmName: "Fenwold Electrical Ltd",
  sender: "Nia Beckwith",
  phone: "01632 960118",
};

describe("the drafted letter", () => {
  it("chases with the paper's name in the sentence and its capitals kept", () => {
    const { body } = submissionLetter(facts);
    expect(body).toContain("our application before installing an EV chargepoint for The Old Bakery");
    expect(body).toContain("12 working days have passed since.");
    expect(body).toContain("The sealed pack is attached again, version 1.");
  });

  it("answers a question with the operator's own words in its second paragraph, and does not chase", () => {
    const asked = { ...facts, state: "question" as const, question: "Send a photo of the service head." };
    const paragraphs = submissionLetter(asked).body.split("\n\n");
    expect(paragraphs[1]).toContain("you asked: “Send a photo of the service head.”");
    expect(paragraphs[2]).toContain("attached again");
    expect(paragraphs.join(" ")).not.toContain("tell us how it stands");
  });
});
