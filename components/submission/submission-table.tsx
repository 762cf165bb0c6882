"use client";

import Link from "next/link";
import { useState, type ReactNode } from "react";
import { leftInWords, shortDate } from "@/components/ui/dates";
import { DownIcon, SortIcon, TurnIcon } from "@/components/ui/icons";
import { withQuery, type Query } from "@/components/ui/query-link";
import { submissionPurposeName, submissionStateName } from "@/lib/notify/submission";
import type { SubmissionRow } from "@/lib/notify/views";
import { BulkBar, type SendBatch } from "./bulk-bar";

type Props = {
  rows: SubmissionRow[];
  today: string;
  query: Query;
  openId: string | null;
  inHand: ReactNode;
  sendBatch: SendBatch | null;
};

/** Rows that may leave together: sealed, not sent. */
const maySend = (row: SubmissionRow) => row.packId !== null && (row.state === "draft" || row.state === "bounced");

/** The desk's table. The row in hand opens in place; ticked rows leave together by the bar below. */
export function SubmissionTable({ rows, today, query, openId, inHand, sendBatch }: Props) {
  const [picked, setPicked] = useState<ReadonlySet<string>>(new Set());
  const pickable = sendBatch ? rows.filter(maySend) : [];
  const chosen = pickable.filter(({ id }) => picked.has(id));
  const all = pickable.length > 0 && chosen.length === pickable.length;
  const pick = (id: string, on: boolean) => {
    const next = new Set(picked);
    if (on) next.add(id);
    else next.delete(id);
    setPicked(next);
  };
  return (
    <>
      <table className="desk desk--submissions">
        <caption className="vh">Submissions, the earliest due first</caption>
        <thead>
          <tr>
            <th>
              {pickable.length > 0 ? (
                <input
                  className="check"
                  type="checkbox"
                  aria-label="Select all that may be sent"
                  checked={all}
                  onChange={() => setPicked(all ? new Set() : new Set(pickable.map(({ id }) => id)))}
                />
              ) : (
                <span className="vh">Select</span>
              )}
            </th>
            <th>Job</th>
            <th>Site</th>
            <th>Operator</th>
            <th>Paper</th>
            <th>State</th>
            <th>Sent</th>
            <th className="num">
              <abbr title="Working days since sending">Days</abbr>
            </th>
            <th aria-sort="ascending">
              Due <SortIcon />
            </th>
            <th>Left</th>
            <th>Next step</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row
              key={row.id}
              row={row}
              today={today}
              query={query}
              open={row.id === openId}
              inHand={inHand}
              picked={picked.has(row.id)}
              pick={sendBatch && maySend(row) ? (on) => pick(row.id, on) : null}
            />
          ))}
        </tbody>
      </table>
      {sendBatch && chosen.length > 0 && <BulkBar rows={chosen} send={sendBatch} clear={() => setPicked(new Set())} />}
    </>
  );
}

type RowProps = {
  row: SubmissionRow;
  today: string;
  query: Query;
  open: boolean;
  inHand: ReactNode;
  picked: boolean;
  pick: ((on: boolean) => void) | null;
};

function Row({ row, today, query, open, inHand, picked, pick }: RowProps) {
  const urgency =
    row.daysLeft === null ? undefined : row.daysLeft < 0 ? "is-late" : row.daysLeft <= 3 ? "is-near" : undefined;
  return (
    <>
      <tr className={open ? "is-open" : picked ? "is-picked" : undefined} id={`row-${row.id}`}>
        <td className="desk__pick">
          {pick && (
            <input
              className="check"
              type="checkbox"
              aria-label={`Select ${row.jobNumber}`}
              checked={picked}
              onChange={(event) => pick(event.currentTarget.checked)}
            />
          )}
        </td>
        <td className="mono">
          <Link href={withQuery(`/jobs/${row.jobId}/submission`)}>{row.jobNumber}</Link>
        </td>
        <td className="desk__site" title={row.site}>
          {row.site}
        </td>
        <td title={row.operatorName}>{row.operatorName}</td>
        <td title={submissionPurposeName[row.purpose]}>{submissionPurposeName[row.purpose]}</td>
        <td title={submissionStateName[row.state]}>{submissionStateName[row.state]}</td>
        <td>{row.sentOn && shortDate(row.sentOn, today)}</td>
        <td className="num">{row.workingDaysSinceSent}</td>
        <td className={urgency}>{row.dueOn && shortDate(row.dueOn, today)}</td>
        <td className={urgency}>{row.daysLeft !== null && leftInWords(row.daysLeft)}</td>
        <td>
          <Link
            className="desk__next"
            href={withQuery("/submissions", query, { open: open ? null : row.id })}
            scroll={false}
            aria-expanded={open}
          >
            <span title={row.nextStep}>{row.nextStep}</span>
            {open ? <DownIcon size={14} /> : <TurnIcon size={14} />}
            <span className="vh">, history of {row.jobNumber}</span>
          </Link>
        </td>
      </tr>
      {open && (
        <tr className="in-hand">
          <td colSpan={11}>{inHand}</td>
        </tr>
      )}
    </>
  );
}
