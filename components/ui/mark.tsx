import type { Outcome } from "@/lib/notify/result";

export const outcomeWord: Record<Outcome, string> = {
  met: "Met",
  "not-met": "Not met",
  "cannot-tell": "Cannot tell",
  "not-applicable": "Not applicable",
};

const markClass: Record<Outcome, string> = {
  met: "mark--met",
  "not-met": "mark--not-met",
  "cannot-tell": "mark--cannot-tell",
  "not-applicable": "mark--na",
};

/** Disc with tick, square with cross, ring with question mark, bare bar: four silhouettes, told apart without colour. */
export function OutcomeGlyph({ outcome, size = 16 }: { outcome: Outcome; size?: number }) {
  return (
    <svg viewBox="0 0 20 20" width={size} height={size} fill="none" aria-hidden="true">
      {glyph[outcome]}
    </svg>
  );
}

const glyph: Record<Outcome, React.ReactNode> = {
  met: (
    <>
      <circle cx="10" cy="10" r="9.5" fill="currentColor" />
      <path d="M5.4 10.6 8.7 13.8 14.6 6.8" stroke="var(--color-sheet)" strokeWidth="2.4" />
    </>
  ),
  "not-met": (
    <>
      <path d="M1 1H19V19H1Z" fill="currentColor" />
      <path d="M6 6 14 14M14 6 6 14" stroke="var(--color-sheet)" strokeWidth="2.4" />
    </>
  ),
  "cannot-tell": (
    <>
      <circle cx="10" cy="10" r="8.6" stroke="currentColor" strokeWidth="1.9" />
      <path
        d="M7.2 8.1C7.2 6.4 8.4 5.4 10 5.4S12.8 6.4 12.8 7.9C12.8 9.9 10 9.9 10 11.8"
        stroke="currentColor"
        strokeWidth="1.9"
      />
      <circle cx="10" cy="14.5" r="1.25" fill="currentColor" />
    </>
  ),
  "not-applicable": <path d="M3 10H17" stroke="currentColor" strokeWidth="2" />,
};

/** An outcome: its sign and always a word. `children` replaces the word ("Electrode not met"), never removes it. */
export function Mark({ outcome, children }: { outcome: Outcome; children?: React.ReactNode }) {
  return (
    <span className={`mark ${markClass[outcome]}`}>
      <OutcomeGlyph outcome={outcome} />
      {children ?? outcomeWord[outcome]}
    </span>
  );
}

/** Signs with counts, in the fixed order not met, cannot tell, met, not applicable. The word is given to screen readers. */
export function Tally({ counts, all = false }: { counts: Record<Outcome, number>; all?: boolean }) {
  const order: Outcome[] = ["not-met", "cannot-tell", "met", "not-applicable"];
  const open = order.slice(0, 2).filter((outcome) => counts[outcome] > 0);
  const shown = all ? order.filter((outcome) => counts[outcome] > 0) : open.length ? open : settled(counts);
  return (
    <span className="tally">
      {shown.map((outcome) => (
        <span key={outcome} className={`mark ${markClass[outcome]}`}>
          <OutcomeGlyph outcome={outcome} size={14} />
          {counts[outcome]}
          <span className="vh"> {outcomeWord[outcome].toLowerCase()}</span>
        </span>
      ))}
    </span>
  );
}

const settled = (counts: Record<Outcome, number>): Outcome[] => (counts.met > 0 ? ["met"] : ["not-applicable"]);
