"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { clockTime } from "@/components/ui/dates";
import { TickIcon } from "@/components/ui/icons";

export type CopySection = {
  section: string;
  rows: readonly { key: string; label: string; value: string | null; unit: string | null }[];
};

/** The data in the order an operator's own page asks for it, each value one press away from the clipboard. */
export function CopySheet({ sections }: { sections: readonly CopySection[] }) {
  const [copied, setCopied] = useState<Record<string, string>>({});
  const [failed, setFailed] = useState<string | null>(null);
  const copy = async (key: string, text: string) => {
    try {
      await navigator.clipboard.writeText(text);
      setCopied((before) => ({ ...before, [key]: new Date().toISOString() }));
      setFailed(null);
    } catch (error) {
      console.warn("The value could not be copied.", error);
      setFailed(key);
    }
  };
  const total = sections.reduce((sum, { rows }) => sum + rows.length, 0);
  return (
    <details className="copy-sheet">
      <summary>Copy into the operator’s own page, {total} values in order</summary>
      <table className="ledger copy">
        <thead>
          <tr>
            <th>Asked for</th>
            <th>Value</th>
            <th>
              <span className="vh">Copy</span>
            </th>
          </tr>
        </thead>
        {sections.map(({ section, rows }) => (
          <tbody key={section}>
            <tr className="group">
              <th colSpan={3} scope="rowgroup">
                <div>
                  <h3>{section}</h3>
                </div>
              </th>
            </tr>
            {rows.map(({ key, label, value, unit }) => (
              <tr key={key}>
                <th scope="row">{label}</th>
                <td className={value === null ? "quiet" : undefined}>
                  {value === null ? "not recorded" : unit ? `${value} ${unit}` : value}
                </td>
                <td>
                  {value !== null && (
                    <Button kind="plain" onClick={() => void copy(key, value)}>
                      {failed === key ? "Select and copy by hand" : <CopiedWords at={copied[key] ?? null} />}
                      <span className="vh">: {label}</span>
                    </Button>
                  )}
                </td>
              </tr>
            ))}
          </tbody>
        ))}
      </table>
    </details>
  );
}

/** Copied is not an outcome: a tick and the time, in ink. */
function CopiedWords({ at }: { at: string | null }) {
  if (!at) return "Copy";
  return (
    <span className="copied">
      <TickIcon /> {clockTime(at)}
    </span>
  );
}
