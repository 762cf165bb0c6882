const steps = [
  ["Job", "Each fact once, on the drive"],
  ["Assessment", "Notify or apply, with reasons"],
  ["Pack", "Numbered and sealed"],
  ["Submission", "Sent with proof, then chased"],
  ["Review", "Settings beside evidence"],
] as const;

/** The five nouns on their wire, ending in the tag's eyelet. Drawn on wide screens only. */
export function SignInWire() {
  return (
    <>
      <Wire part="out" d="M0 0Q54 54 100 -10Q160 -60 400 20" />
      <ol className="sign-in__thread">
        {steps.map(([name, what], index) => (
          <li key={name}>
            {index === 0 && <Wire part="in" d="M0 0Q50 34 100 20" />}
            {index < steps.length - 1 && <Wire part="on" d="M0 0Q50 26 100 0" />}
            <p>
              <b>{name}</b>
              {what}
            </p>
            {name === "Pack" && <ExampleSeal />}
            <svg className="sign-in__eyelet" viewBox="-24 -24 48 48" fill="none" aria-hidden="true">
              <circle r="17" fill="var(--color-copper)" stroke="var(--color-ink)" strokeWidth="6" />
              <path d="M-22.5 5.9-12 3.4" stroke="var(--color-paper)" strokeWidth="9" />
              <path d="M-24 6.3-8 2.3" stroke="var(--color-copper)" strokeWidth="5" />
            </svg>
          </li>
        ))}
      </ol>
      <Wire part="tag" d="M0 0Q50 46 100 0" />
    </>
  );
}

/** The open eyelet at the head of the tag, the wire's end lying over its left rim. */
export const TagEyelet = () => (
  <svg className="tag__eyelet" viewBox="-24 -24 48 48" fill="none" aria-hidden="true">
    <circle r="17" fill="var(--color-paper)" stroke="var(--color-ink)" strokeWidth="6" />
    <path d="M-22.5 5.3-12 2.8" stroke="var(--color-sheet)" strokeWidth="9" />
    <path d="M-27 6.2 0 0" stroke="var(--color-copper)" strokeWidth="5" strokeLinecap="round" />
  </svg>
);

function Wire({ part, d }: { part: "in" | "on" | "tag" | "out"; d: string }) {
  return (
    <svg
      className={`sign-in__wire sign-in__wire--${part}`}
      viewBox="0 0 100 40"
      preserveAspectRatio="none"
      fill="none"
      aria-hidden="true"
    >
      <path d={d} />
    </svg>
  );
}

/** What a sealed pack wears, on a longer wire than in the program. */
const ExampleSeal = () => (
  <svg className="sign-in__seal" viewBox="-40 0 80 152" width="80" height="152" fill="none" aria-hidden="true">
    <g stroke="var(--color-copper)" strokeWidth="3.2" strokeLinecap="round">
      <path d="M-7 19C-3 38 8 40 7 56S-3 72 -2 90" />
      <path d="M7 19C3 38 -8 40 -7 56S3 72 2 90" stroke="var(--color-paper)" strokeWidth="6.4" strokeLinecap="butt" />
      <path d="M7 19C3 38 -8 40 -7 56S3 72 2 90" />
    </g>
    <path d="M-7 82H7V96H-7Z" fill="var(--color-lead)" />
    <circle cy="120" r="31" fill="var(--color-lead)" />
    <circle cy="120" r="25.5" stroke="var(--color-sheet)" strokeOpacity=".7" strokeWidth="1.25" />
    <g className="seal__letters" fontSize="14" fontWeight="500" fill="var(--color-sheet)" textAnchor="middle">
      <text y="118">a41f</text>
      <text y="133">09c7</text>
    </g>
  </svg>
);
