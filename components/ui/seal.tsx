/** The lead seal. Only a sealed pack has one: it is never drawn before sealing and never greyed out. */

/** Small, hanging from an eyelet of the thread, 32 x 56. */
export function HangingSeal() {
  return (
    <svg viewBox="0 0 32 56" width="32" height="56" fill="none" aria-hidden="true" className="thread__seal">
      <g stroke="var(--color-copper)" strokeWidth="2" strokeLinecap="round">
        <path d="M12.5 1C14 8 20 10 19.5 15.5S14.5 22 15 30" />
        <path
          d="M19.5 1C18 8 12 10 12.5 15.5S17.5 22 17 30"
          stroke="var(--color-sheet)"
          strokeWidth="4"
          strokeLinecap="butt"
        />
        <path d="M19.5 1C18 8 12 10 12.5 15.5S17.5 22 17 30" />
      </g>
      <path d="M12.5 27H19.5V33H12.5Z" fill="var(--color-lead)" />
      <circle cx="16" cy="41" r="12" fill="var(--color-lead)" />
      <circle cx="16" cy="41" r="8.75" stroke="var(--color-sheet)" strokeOpacity=".75" strokeWidth="1.1" />
      <path d="M11 41H14M18 41H21" stroke="var(--color-sheet)" strokeWidth="1.4" />
      <circle cx="16" cy="41" r="2.6" stroke="var(--color-sheet)" strokeWidth="1.4" />
    </svg>
  );
}

/** Flat, in a line of text. */
export function FlatSeal({ size = 20 }: { size?: number }) {
  return (
    <svg viewBox="0 0 24 24" width={size} height={size} fill="none" aria-hidden="true">
      <circle cx="12" cy="12" r="11" fill="var(--color-lead)" />
      <circle cx="12" cy="12" r="8" stroke="var(--color-sheet)" strokeOpacity=".75" strokeWidth="1.1" />
      <path d="M7 12H9.6M14.4 12H17" stroke="var(--color-sheet)" strokeWidth="1.5" />
      <circle cx="12" cy="12" r="2.5" stroke="var(--color-sheet)" strokeWidth="1.5" />
    </svg>
  );
}

/** Large, with the first eight characters of the hash pressed into it in two lines of four. `parted`: a failed check. */
export function LargeSeal({ hash8, parted = false }: { hash8: string; parted?: boolean }) {
  const said = `Lead seal, ${hash8}${parted ? ", wire parted" : ""}`;
  return (
    <svg
      className="sealed__lead"
      viewBox={parted ? "0 0 132 200" : "0 0 120 184"}
      width={parted ? 132 : 120}
      height={parted ? 200 : 184}
      fill="none"
      role="img"
      aria-label={said}
    >
      {parted ? <PartedPair /> : <TwistedPair />}
      <g transform={parted ? "translate(9 14) rotate(9 60 130)" : undefined}>
        {parted && <LowerEnds />}
        <path d="M50 78H70V96H50Z" fill="var(--color-lead)" />
        <circle cx="60" cy="130" r="46" fill="var(--color-lead)" />
        <circle cx="60" cy="130" r="38.5" stroke="var(--color-sheet)" strokeOpacity=".75" strokeWidth="1.5" />
        <g className="seal__letters" fontSize="20" fontWeight="500" fill="var(--color-sheet)" textAnchor="middle">
          <text x="60" y="127">
            {hash8.slice(0, 4)}
          </text>
          <text x="60" y="148">
            {hash8.slice(4, 8)}
          </text>
        </g>
      </g>
    </svg>
  );
}

const strands = { stroke: "var(--color-copper)", strokeWidth: 3, strokeLinecap: "round" } as const;
const gap = { stroke: "var(--color-sheet)", strokeWidth: 6.5, strokeLinecap: "butt" } as const;

const TwistedPair = () => (
  <g {...strands}>
    <path d="M46 0C50 22 68 26 66 42S50 60 52 84" />
    <path d="M74 0C70 22 52 26 54 42S70 60 68 84" {...gap} />
    <path d="M74 0C70 22 52 26 54 42S70 60 68 84" />
  </g>
);
const PartedPair = () => (
  <g {...strands}>
    <path d="M46 0C48 12 55 18 60 24C64 29 62 35 58 39" />
    <path d="M74 0C72 12 65 18 61 23" {...gap} />
    <path d="M74 0C72 12 66 18 61 23C57 29 64 34 72 37" />
  </g>
);
const LowerEnds = () => (
  <g {...strands}>
    <path d="M46 52C52 58 64 62 66 68S54 76 53 84" />
    <path d="M76 50C68 56 56 60 55 68S66 76 67 84" {...gap} />
    <path d="M76 50C68 56 56 60 55 68S66 76 67 84" />
  </g>
);
