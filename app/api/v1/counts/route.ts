import { counts } from "@/db/queries/jobs";
import { handler } from "@/lib/server/handler";

/** How much each place of the contents list holds for this person. */
export const GET = handler({ permission: "jobs.read" }, ({ viewer }) => counts(viewer));
