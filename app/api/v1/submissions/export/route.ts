import { submissionCsv } from "./csv";
import { submissionFilter } from "../../inputs";
import { exportSubmissions } from "@/db/queries/submissions";
import { handler } from "@/lib/server/handler";

/** The rows of the desk's filter as CSV, at most 5,000. */
export const GET = handler({ query: submissionFilter, permission: "submissions.read" }, async ({ viewer, query }) => {
  const rows = await exportSubmissions(viewer, query);
  if (!rows.ok) return rows;
  return new Response(submissionCsv(rows.value), {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": `attachment; filename="submissions-${query.tab}.csv"`,
    },
  });
});
