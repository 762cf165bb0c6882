import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import type { SubmissionActs } from "@/components/submission/acts";
import { DeskFilters } from "@/components/submission/desk-filters";
import { Hand } from "@/components/submission/hand";
import { SubmissionTable } from "@/components/submission/submission-table";
import { deskTabs, DeskTabs, type DeskTab } from "@/components/submission/tabs";
import { counted } from "@/components/ui/counted";
import { Pager, rangeInWords } from "@/components/ui/pager";
import { idOf, oneOf, withQuery, wordOf, type Query } from "@/components/ui/query-link";
import { today } from "@/db/clock";
import { getSubmission, listSubmissions } from "@/db/queries/submissions";
import { may } from "@/lib/notify/permissions";
import { submissionPurposes } from "@/lib/notify/submission";
import type { SubmissionFilter } from "@/lib/notify/views";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";
import { recordMoveAct, recordNoteAct, recordSentAct, sendAct, sendBatchAct } from "./actions";

export const metadata: Metadata = { title: "Submissions" };

const acts: SubmissionActs = {
  send: sendAct,
  recordSent: recordSentAct,
  recordMove: recordMoveAct,
  recordNote: recordNoteAct,
};

export default async function SubmissionsPage({ searchParams }: PageProps<"/submissions">) {
  const viewer = await requireViewer();
  const asked = await searchParams;
  const filter: SubmissionFilter = {
    tab: wordOf(asked.tab, deskTabs) ?? "needs-someone",
    q: oneOf(asked.q),
    operatorId: oneOf(asked.operator),
    purpose: wordOf(asked.purpose, submissionPurposes),
    after: oneOf(asked.after),
  };
  const seen = filter.after ? Number(oneOf(asked.seen) ?? 0) || 0 : 0;
  const query: Query = {
    tab: filter.tab === "needs-someone" ? null : filter.tab,
    q: filter.q,
    operator: filter.operatorId,
    purpose: filter.purpose,
  };
  const openId = idOf(asked.open);
  const [list, opened] = await Promise.all([
    listSubmissions(viewer, filter),
    openId ? getSubmission(viewer, { submissionId: openId }) : null,
  ]);
  const { rows, tabs, total, next } = valueOf(list);
  const inHand = opened?.ok ? opened.value : null;
  const listed = inHand && !rows.some(({ id }) => id === inHand.id) ? [inHand, ...rows] : rows;
  const mayWrite = may(viewer.roles, "submissions.write");
  const on = today();
  return (
    <main id="main" className="deskmain">
      <PageHead title="Submissions" say={standing(tabs)}>
        <a className="btn" href={withQuery("/api/v1/submissions/export", query, { tab: filter.tab })} download>
          Export CSV
        </a>
      </PageHead>
      <div className="sheet">
        <DeskTabs current={filter.tab} counts={tabs} query={{ ...query, tab: null }} />
        <DeskFilters key={JSON.stringify(query)} filter={filter} count={rangeInWords(seen, rows.length, total)} />
        {listed.length > 0 ? (
          <SubmissionTable
            rows={listed}
            today={on}
            query={{ ...query, after: filter.after, seen: seen ? String(seen) : null }}
            openId={inHand?.id ?? null}
            inHand={inHand && <Hand key={inHand.id} submission={inHand} acts={mayWrite ? acts : null} today={on} />}
            sendBatch={mayWrite ? sendBatchAct : null}
          />
        ) : (
          <p className="none">
            {filter.q || filter.operatorId || filter.purpose
              ? "Nothing in this pile matches."
              : "Nothing in this pile."}
          </p>
        )}
        <Pager path="/submissions" query={query} seen={seen} shown={rows.length} next={next} />
      </div>
    </main>
  );
}

function standing(tabs: Record<DeskTab, number>) {
  const late = tabs["past-last-day"];
  const someone = `${counted(tabs["needs-someone"], "needs someone", "need someone")}.`;
  return late > 0 ? `${someone} ${counted(late, "is past its last day", "are past their last day")}.` : someone;
}
