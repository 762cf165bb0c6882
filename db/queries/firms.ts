import { eq, sql, and } from "drizzle-orm";
import { movedOn, refusal } from "../permission";
import { recordEvent } from "../record-event";
import { firms } from "../schema";
import { asFirm } from "../tenant";
import { ok, type Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";

export type FirmFacts = {
  name: string;
  contactName: string | null;
  phone: string | null;
  email: string | null;
  address: string[];
  registration: string | null;
};
export type FirmView = FirmFacts & { id: string; numberPrefix: string; version: number };

const columns = {
  id: firms.id,
  name: firms.name,
  contactName: firms.contactName,
  phone: firms.phone,
  email: firms.email,
  address: firms.address,
  registration: firms.registration,
  numberPrefix: firms.numberPrefix,
  version: firms.version,
};

async function firmOf(viewer: Viewer): Promise<FirmView> {
  const [firm] = await asFirm(viewer, (tx) => tx.select(columns).from(firms).where(eq(firms.id, viewer.firmId)));
  if (!firm) throw new Error(`firm ${viewer.firmId} has no row`);
  return firm;
}

/** The firm's own facts, as each new job takes them over. */
export async function getFirm(viewer: Viewer): Promise<Result<FirmView>> {
  const refused = refusal(viewer, "firm.read");
  return refused ?? ok(await firmOf(viewer));
}

/** Changes the firm's facts for jobs opened from now on; jobs already open keep theirs. Failure: `conflict`. */
export async function saveFirm(viewer: Viewer, input: FirmFacts & { version: number }): Promise<Result<FirmView>> {
  const refused = refusal(viewer, "firm.manage");
  if (refused) return refused;
  const { version, name, contactName, phone, email, address, registration } = input;
  const facts: FirmFacts = { name, contactName, phone, email, address, registration };
  return asFirm(viewer, async (tx) => {
    const [before] = await tx.select(columns).from(firms).where(eq(firms.id, viewer.firmId)).for("update");
    const [after] = await tx
      .update(firms)
      .set({ ...facts, version: sql`${firms.version} + 1` })
      .where(and(eq(firms.id, viewer.firmId), eq(firms.version, version)))
      .returning(columns);
    if (!after || !before) return movedOn("firm");
    const fields = (Object.keys(facts) as (keyof FirmFacts)[]).filter(
      (name) => JSON.stringify(before[name]) !== JSON.stringify(after[name]),
    );
    if (fields.length) await recordEvent(tx, viewer, { type: "firm.changed", version: 1, fields });
    return ok(after);
  });
}
