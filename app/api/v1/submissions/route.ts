import { submissionFilter } from "../inputs";
import { listSubmissions } from "@/db/queries/submissions";
import { handler } from "@/lib/server/handler";

/** One page of the submissions desk, with the count of each tab. */
export const GET = handler({ query: submissionFilter, permission: "submissions.read" }, ({ viewer, query }) =>
  listSubmissions(viewer, query),
);
