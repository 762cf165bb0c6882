"use client";

import { useState } from "react";
import { DownIcon, TurnIcon } from "@/components/ui/icons";
import { Tally } from "@/components/ui/mark";
import type { CheckGroup } from "./check-rows";
import { CheckRowView } from "./check-row-view";

/** The checks by group. A group with nothing to see is closed and shows its tally; a row opens to its workings. */
export function Checks({ groups }: { groups: CheckGroup[] }) {
  const [open, setOpen] = useState<ReadonlySet<string>>(
    () => new Set(groups.filter(({ isSettled }) => !isSettled).map(({ name }) => name)),
  );
  const toggle = (name: string) =>
    setOpen((before) => {
      const next = new Set(before);
      if (!next.delete(name)) next.add(name);
      return next;
    });
  return (
    <table className="ledger ledger--checks">
      <thead>
        <tr>
          <th className="col-outcome">Outcome</th>
          <th>Check</th>
          <th className="fig col-recorded">Recorded</th>
          <th className="fig col-limit">Limit</th>
          <th className="col-source">Source</th>
          <th className="col-turn">
            <span className="vh">Workings</span>
          </th>
        </tr>
      </thead>
      {groups.map((group) => (
        <Group key={group.name} group={group} isOpen={open.has(group.name)} toggle={() => toggle(group.name)} />
      ))}
    </table>
  );
}

function Group({ group, isOpen, toggle }: { group: CheckGroup; isOpen: boolean; toggle: () => void }) {
  return (
    <tbody>
      <tr className="group">
        <th colSpan={6} scope="rowgroup">
          <div>
            <h3>{group.name}</h3>
            <Tally counts={group.tally} all />
            <span className="turn">
              <button
                type="button"
                aria-expanded={isOpen}
                aria-label={`${isOpen ? "Hide" : "Show"} ${group.name.toLowerCase()} checks`}
                onClick={toggle}
              >
                {isOpen ? <DownIcon /> : <TurnIcon />}
              </button>
            </span>
          </div>
        </th>
      </tr>
      {isOpen && group.rows.map((row) => <CheckRowView key={row.key} row={row} as="check" />)}
    </tbody>
  );
}
