export type Wire = "whole" | "to-here" | "ahead";

/** The stretch of wire beside a question or a row; `at` is how far down its stitch stands, 12 px in the first line. */
export function WireBeside({ wire, at = 12 }: { wire: Wire; at?: number }) {
  return (
    <svg className="stretch" aria-hidden="true">
      {wire === "whole" && <line x1="22" y1="0" x2="22" y2="100%" />}
      {wire === "to-here" && (
        <>
          <line x1="22" y1="0" x2="22" y2={at} />
          <line className="ahead" x1="22" y1={at + 16} x2="22" y2="100%" />
        </>
      )}
      {wire === "ahead" && <line className="ahead" x1="22" y1="3.5" x2="22" y2="100%" />}
    </svg>
  );
}
