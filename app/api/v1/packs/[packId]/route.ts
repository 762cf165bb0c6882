import { z } from "zod";
import { id } from "../../inputs";
import { getPack } from "@/db/queries/packs";
import { handler } from "@/lib/server/handler";

/** One version of a pack, with its progress while it is being built. */
export const GET = handler({ params: z.object({ packId: id }), permission: "packs.read" }, ({ viewer, params }) =>
  getPack(viewer, params),
);
