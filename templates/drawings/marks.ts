import type { Outcome } from "@/lib/notify/result";

/** The word that always stands beside an outcome's shape. */
export const outcomeWord: Readonly<Record<Outcome, string>> = {
  met: "Met",
  "not-met": "Not met",
  "cannot-tell": "Cannot tell",
  "not-applicable": "Not applicable",
};

const ink = "#1b211e";

/** Four silhouettes that differ without colour: disc with tick, square with cross, ring with question mark, bare bar. */
const shapes: Readonly<Record<Outcome, string>> = {
  met: `<circle cx="10" cy="10" r="9.5" fill="${ink}"/><path d="M5.4 10.6 8.7 13.8 14.6 6.8" fill="none" stroke="#fff" stroke-width="2.4"/>`,
  "not-met": `<rect x="1" y="1" width="18" height="18" fill="${ink}"/><path d="M6 6 14 14M14 6 6 14" stroke="#fff" stroke-width="2.6"/>`,
  "cannot-tell": `<circle cx="10" cy="10" r="8.6" fill="#fff" stroke="${ink}" stroke-width="1.8"/><path d="M7.2 8C7.2 6.3 8.4 5.3 10 5.3S12.8 6.3 12.8 7.8C12.8 9.6 10 9.7 10 11.6" fill="none" stroke="${ink}" stroke-width="1.8"/><circle cx="10" cy="14.3" r="1.25" fill="${ink}"/>`,
  "not-applicable": `<path d="M3 10H17" stroke="${ink}" stroke-width="2"/>`,
};

const framed = (size: number, marks: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${size} ${size}" width="${size}" height="${size}" aria-hidden="true">${marks}</svg>`;

/** The outcome's shape in ink, 20 by 20. */
export const outcomeMark = (outcome: Outcome): string => framed(20, shapes[outcome]);

/** The triangle of a caution plate, 24 by 24. */
export const cautionMark: string = framed(
  24,
  `<path d="M12 2.5 22.5 21H1.5Z" fill="none" stroke="${ink}" stroke-width="2" stroke-linejoin="round"/><path d="M12 9V15" stroke="${ink}" stroke-width="2.2"/><circle cx="12" cy="17.9" r="1.3" fill="${ink}"/>`,
);

/** The wire and the eyelet that stand before the header rule: the one trace of copper on paper. */
export const headerWire = `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 76 16" width="76" height="16" aria-hidden="true"><path d="M0 8H62" stroke="#a8501f" stroke-width="2"/><circle cx="66" cy="8" r="4.5" fill="#fff" stroke="${ink}" stroke-width="2"/><path d="M58 8H66" stroke="#a8501f" stroke-width="2"/></svg>`;
