import { z } from "zod";
import { id } from "../../../inputs";
import { openPack } from "@/db/queries/packs";
import { handler } from "@/lib/server/handler";

/** The sealed zip, as a download. */
export const GET = handler(
  { params: z.object({ packId: id }), permission: "packs.read" },
  async ({ viewer, params }) => {
    const pack = await openPack(viewer, params);
    if (!pack.ok) return pack;
    const { stream, bytes, fileName } = pack.value;
    return new Response(stream, {
      headers: {
        "content-type": "application/zip",
        "content-length": String(bytes),
        "content-disposition": `attachment; filename="${fileName}"`,
      },
    });
  },
);
