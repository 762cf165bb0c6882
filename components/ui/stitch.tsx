/** One stitch of the phone's thread: how one fact, photo or stop of the day stands. */
export type StitchState = "answered" | "in-hand" | "not-known" | "past-a-gap" | "not-yet" | "take-again" | "stopped";

const shape: Record<StitchState, React.ReactNode> = {
  answered: (
    <>
      <circle cx="12" cy="12" r="6.5" fill="var(--color-copper)" stroke="var(--color-ink)" strokeWidth="2.5" />
      <path d="M12 2.8V7.4" stroke="var(--color-paper)" strokeWidth="5.2" />
      <path d="M12 0V10" stroke="var(--color-copper)" strokeWidth="3" />
    </>
  ),
  "in-hand": (
    <>
      <circle cx="12" cy="12" r="8.5" fill="var(--color-paper)" stroke="var(--color-ink)" strokeWidth="3" />
      <path d="M12 .8V6" stroke="var(--color-paper)" strokeWidth="5.4" />
      <path d="M12 0V12" stroke="var(--color-copper)" strokeWidth="3" strokeLinecap="round" />
    </>
  ),
  "not-known": (
    <>
      <circle cx="12" cy="12" r="9.5" fill="var(--color-paper)" stroke="var(--color-ink)" strokeWidth="2.5" />
      <path
        d="M8.8 10C8.8 8 10.2 6.8 12 6.8S15.2 8 15.2 9.8C15.2 12.1 12 12 12 14"
        stroke="currentColor"
        strokeWidth="2.1"
      />
      <circle cx="12" cy="17" r="1.4" fill="currentColor" />
    </>
  ),
  "past-a-gap": (
    <>
      <circle cx="12" cy="12" r="9.5" fill="var(--color-paper)" />
      <circle cx="12" cy="12" r="6.5" fill="var(--color-copper)" stroke="var(--color-ink)" strokeWidth="2.5" />
    </>
  ),
  "not-yet": (
    <>
      <circle cx="12" cy="12" r="8" fill="var(--color-paper)" />
      <circle cx="12" cy="12" r="6" stroke="var(--color-rule-strong)" strokeWidth="1.75" />
    </>
  ),
  "take-again": (
    <>
      <path d="M3.5 3.5H20.5V20.5H3.5Z" fill="var(--color-oxide)" />
      <path d="M8 8 16 16M16 8 8 16" stroke="var(--color-sheet)" strokeWidth="2.6" />
    </>
  ),
  stopped: (
    <>
      <path d="M3.5 3.5H20.5V20.5H3.5Z" fill="var(--color-oxide)" />
      <path d="M8 8 16 16M16 8 8 16" stroke="var(--color-sheet)" strokeWidth="2.6" />
    </>
  ),
};

export function Stitch({ state }: { state: StitchState }) {
  return (
    <svg viewBox="0 0 24 24" width="24" height="24" fill="none" aria-hidden="true" className="stitch">
      {shape[state]}
    </svg>
  );
}

/**
 * The stretch of wire beside one block of a phone page (its parent must be `position: relative`, as `.step`, `.q`,
 * `.day-row` are). `wire`: "whole" runs through, "to-here" ends in this block's stitch and dots on, "ahead" is dotted,
 * "end" and "ahead-end" end in this block's stitch with nothing after it.
 */
export function Stretch({ wire }: { wire: "whole" | "to-here" | "ahead" | "end" | "ahead-end" }) {
  return (
    <svg className="stretch" aria-hidden="true">
      {wire === "whole" && <line x1="22" y1="0" x2="22" y2="100%" />}
      {(wire === "to-here" || wire === "end") && <line x1="22" y1="0" x2="22" y2="24" />}
      {wire === "to-here" && <line className="ahead" x1="22" y1="40" x2="22" y2="100%" />}
      {wire === "ahead-end" && <line className="ahead" x1="22" y1="3.5" x2="22" y2="24" />}
      {wire === "ahead" && <line className="ahead" x1="22" y1="3.5" x2="22" y2="100%" />}
    </svg>
  );
}
