"use server";

import { z } from "zod";
import { copyJob } from "@/db/queries/jobs";
import { sealPack } from "@/db/queries/packs";
import { viewerAction } from "@/lib/server/actions";

/** Freezes the record and has its pack built. */
export const sealAct = viewerAction(
  z.object({
    jobId: z.uuid(),
    packId: z.uuid(),
    expectedVersion: z.number().int().positive(),
    declaration: z.object({
      name: z.string().trim().min(1, "Give the name of the competent person").max(200),
      statement: z.string().trim().min(1).max(2000),
    }),
    gapsReason: z
      .string()
      .trim()
      .max(1000, "Use at most 1000 characters")
      .nullable()
      .transform((reason) => reason || null),
  }),
  sealPack,
);

/** Opens a job like this one for another site. */
export const copyAct = viewerAction(z.object({ jobId: z.uuid(), id: z.uuid() }), copyJob);
