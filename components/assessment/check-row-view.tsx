"use client";

import { useState } from "react";
import { DownIcon, TurnIcon } from "@/components/ui/icons";
import { Mark } from "@/components/ui/mark";
import type { CheckRow } from "./check-rows";

type Props = {
  row: CheckRow;
  /** Reasons speak in a sentence, checks in a title with recorded and limit apart. */
  as: "reason" | "check";
};

/** One rule's answer. It opens to the sentence, the workings and every source. */
export function CheckRowView({ row, as }: Props) {
  const [isOpen, setIsOpen] = useState(false);
  const isHeavy = isOpen || row.outcome === "not-met";
  const figures = [row.recorded, row.limit].filter(Boolean).join(" ") || null;
  return (
    <>
      <tr className={isOpen ? "is-open" : undefined}>
        <td>
          <Mark outcome={row.outcome} />
        </td>
        <td className={isHeavy ? "strong" : undefined}>
          {as === "reason" ? row.because : row.title}
          {row.of && <span className="quiet">, {row.of}</span>}
        </td>
        {as === "reason" ? (
          <Figure words={figures} />
        ) : (
          <>
            <Figure words={row.recorded} />
            <Figure words={row.limit} />
          </>
        )}
        <td className="src">{row.source}</td>
        <td className="turn">
          <button
            type="button"
            aria-expanded={isOpen}
            aria-label={`${isOpen ? "Hide" : "Show"} workings: ${row.title}`}
            onClick={() => setIsOpen(!isOpen)}
          >
            {isOpen ? <DownIcon /> : <TurnIcon />}
          </button>
        </td>
      </tr>
      {isOpen && (
        <tr className="is-open work">
          <td />
          <td colSpan={as === "reason" ? 4 : 5}>
            <p>{as === "reason" ? row.title : row.because}</p>
            {row.workings.length > 0 && (
              <ol className="sums-lines" aria-label="Workings">
                {row.workings.map((line, index) => (
                  <li key={index} className="mono">
                    {line}
                  </li>
                ))}
              </ol>
            )}
            <p className="quiet">{row.sources.join("; ")}</p>
          </td>
        </tr>
      )}
    </>
  );
}

const Figure = ({ words }: { words: string | null }) => (
  <td className={words === null ? "fig is-none" : "fig"}>{words ?? "–"}</td>
);
