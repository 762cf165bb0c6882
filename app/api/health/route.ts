import { databaseAnswers } from "@/db/queries/health";
import { ok } from "@/lib/notify/result";
import { publicHandler } from "@/lib/server/handler";

/** Whether this process serves and the database answers; nothing else, for anybody may ask. */
export const GET = publicHandler({}, async () => {
  await databaseAnswers();
  return ok({ status: "healthy" });
});
