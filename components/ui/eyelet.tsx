import type { EyeletStanding } from "@/lib/notify/views";

export type Standing = EyeletStanding["standing"];
/** What lies behind the drawing: the wire is parted from the rim by a gap of this colour. */
export type Surface = "sheet" | "paper";

/**
 * One eyelet of the thread, 40 x 40. The wire goes over the left rim (a gap of the surface's colour at each side)
 * and out under the right one. Ring and core are styled by class so that passing fills it in 150 ms.
 */
export function Eyelet({ standing, surface = "sheet" }: { standing: Standing; surface?: Surface }) {
  const gap = `var(--color-${surface})`;
  return (
    <svg viewBox="0 0 40 40" width="40" height="40" fill="none" aria-hidden="true" className="thread__eyelet">
      {standing === "stopped" ? (
        <>
          <path d="M8 8H32V32H8Z" fill="var(--color-oxide)" />
          <path d="M14 14 26 26M26 14 14 26" stroke="var(--color-sheet)" strokeWidth="3.4" />
        </>
      ) : (
        <>
          {standing === "ahead" && <circle cx="20" cy="20" r="11" fill={gap} />}
          <circle cx="20" cy="20" className={`eyelet__ring eyelet__ring--${standing}`} fill={gap} />
          {standing === "ahead" && <circle cx="20" cy="20" r="6" stroke="var(--color-rule)" strokeWidth="1" />}
          {standing === "passed" && (
            <>
              <path d="M7.2 21.7 12.2 21" stroke={gap} strokeWidth="5.6" />
              <path d="M4 22 18 20.3" stroke="var(--color-copper)" strokeWidth="3" />
            </>
          )}
          {standing === "now" && (
            <>
              <path d="M5.2 21.8 10.4 21.2" stroke={gap} strokeWidth="5.8" />
              <path d="M2 22.2 21 20" stroke="var(--color-copper)" strokeWidth="3" strokeLinecap="round" />
            </>
          )}
        </>
      )}
    </svg>
  );
}
