"use client";

import { Button } from "@/components/ui/button";
import { counted } from "@/components/ui/counted";
import { useAct } from "@/components/ui/use-act";
import type { ActionState } from "@/lib/notify/result";
import type { SubmissionRow } from "@/lib/notify/views";

export type BatchReport = { sent: string[]; failed: { jobNumber: string; message: string }[] };
export type SendBatch = (input: unknown) => Promise<ActionState<BatchReport>>;

/** What is ticked and what will leave: each paper as its own e-mail with its own pack. */
export function BulkBar({ rows, send, clear }: { rows: SubmissionRow[]; send: SendBatch; clear: () => void }) {
  const { state, pending, run } = useAct(send, (report) => {
    if (report.failed.length === 0) clear();
  });
  const operators = [...new Set(rows.map(({ operatorName }) => operatorName))];
  return (
    <div className="bulk" role="region" aria-label="Selected">
      <p className="bulk__what" role="status">
        {state.status === "done" && state.value.failed.length > 0 ? (
          <b>
            {state.value.sent.length} left. Not sent:{" "}
            {state.value.failed.map(({ jobNumber, message }) => `${jobNumber}, ${message}`).join(" ")}
          </b>
        ) : state.status === "failed" ? (
          <b>{state.message}</b>
        ) : (
          <>
            <b>{rows.length} selected.</b> To{" "}
            {operators.length === 1 ? operators[0] : counted(operators.length, "operator")}.{" "}
            <span>{counted(rows.length, "e-mail")}, each with its own pack</span>
          </>
        )}
      </p>
      <Button kind="plain" onClick={clear}>
        Clear
      </Button>
      <Button
        kind="act"
        disabled={pending}
        onClick={() =>
          run({
            papers: rows.map(({ id, version, packId, jobNumber }) => ({
              submissionId: id,
              version,
              packId,
              jobNumber,
            })),
          })
        }
      >
        {pending ? "Sending" : rows.length === 1 ? "Send this one" : `Send batch of ${rows.length}`}
      </Button>
    </div>
  );
}
