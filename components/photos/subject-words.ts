import type { EvidenceSubject } from "@/lib/notify/job/papers";

/** What each photo shows, and how to take it so that it can be read. */
const words: Record<EvidenceSubject, { name: string; how: string }> = {
  intake: { name: "Whole intake", how: "Cut-out, meter and board in one picture" },
  "cut-out": { name: "Cut-out label", how: "Close enough to read the rating" },
  "service-head": { name: "Service head", how: "Every cable, to count them" },
  meter: { name: "Meter", how: "The whole face" },
  "earth-terminal": { name: "Earth terminal", how: "With its label and conductor" },
  bonding: { name: "Bonding", how: "Each clamp with its conductor" },
  "consumer-unit": { name: "Consumer unit", how: "Closed, labels to be read" },
  "rating-plate": { name: "Rating plate", how: "Square on, every figure to be read" },
  chargepoint: { name: "Chargepoint", how: "Where it stands, from two steps back" },
  isolator: { name: "Isolator", how: "Beside the unit" },
  "limit-setting": { name: "Current setting", how: "The screen or switch that sets it" },
  "default-hours-screen": { name: "Default hours screen", how: "The hours as set in the unit" },
  "delay-screen": { name: "Delay screen", how: "Showing the longest delay" },
  "first-use-prompt": { name: "First-use prompt", how: "The question as the owner sees it" },
  "discharge-setting": { name: "Export setting", how: "Showing that export is off" },
  "open-pen-device": { name: "Open-PEN device", how: "Its label" },
  electrode: { name: "Electrode", how: "With its clamp" },
  "neighbour-earths": { name: "Other earths nearby", how: "Taps, lights and fences within reach" },
  damage: { name: "Damage", how: "What you saw, touching nothing" },
  "supply-number": { name: "Supply number", how: "On the bill or the meter" },
  "load-survey": { name: "Load survey", how: "The sheet or the logger’s screen" },
  "test-instrument-screen": { name: "Test instrument", how: "The reading on its screen" },
  other: { name: "Other", how: "Say in the caption what it shows" },
};

const isSubject = (subject: string): subject is EvidenceSubject => Object.hasOwn(words, subject);

export const photoName = (subject: string) => (isSubject(subject) ? words[subject].name : subject);
export const photoHow = (subject: string) => (isSubject(subject) ? words[subject].how : "");
export const photoSubjects = Object.entries(words).map(([subject, { name }]) => ({ subject, name }));
