"use client";

import { useState } from "react";
import { counted } from "@/components/ui/counted";
import { DownIcon, TurnIcon } from "@/components/ui/icons";
import type { CheckRow } from "./check-rows";
import { CheckRowView } from "./check-row-view";

/** Why the route is what it is, what decides it first. Rules that do not apply are folded, and can be read. */
export function ReasonTable({ rows }: { rows: readonly CheckRow[] }) {
  const [isOpen, setIsOpen] = useState(false);
  const applying = rows.filter(({ outcome }) => outcome !== "not-applicable");
  const others = rows.filter(({ outcome }) => outcome === "not-applicable");
  return (
    <table className="ledger ledger--reasons">
      <thead>
        <tr>
          <th className="col-outcome">Outcome</th>
          <th>Because</th>
          <th className="fig col-figures">Figures</th>
          <th className="col-source">Source</th>
          <th className="col-turn">
            <span className="vh">Workings</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {applying.map((row) => (
          <CheckRowView key={row.key} row={row} as="reason" />
        ))}
      </tbody>
      {others.length > 0 && (
        <tbody>
          <tr className="group">
            <th colSpan={5} scope="rowgroup">
              <div>
                <h3>{counted(others.length, "rule does not apply", "rules do not apply")}</h3>
                <span className="turn">
                  <button
                    type="button"
                    aria-expanded={isOpen}
                    aria-label={`${isOpen ? "Hide" : "Show"} rules that do not apply`}
                    onClick={() => setIsOpen(!isOpen)}
                  >
                    {isOpen ? <DownIcon /> : <TurnIcon />}
                  </button>
                </span>
              </div>
            </th>
          </tr>
          {isOpen && others.map((row) => <CheckRowView key={row.key} row={row} as="reason" />)}
        </tbody>
      )}
    </table>
  );
}
