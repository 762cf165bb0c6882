import { and, eq } from "drizzle-orm";
import { atTime, today as dayToday } from "../clock";
import { saveOperatorSettings } from "../queries/operators";
import { createJob } from "../queries/jobs";
import { recordEvent } from "../record-event";
import { db } from "../client";
import { firms, idempotencyKeys, members, users } from "../schema";
import { asFirmId } from "../tenant";
import { doAct, openJob, takePhotos } from "./acts";
import { instantBefore } from "./days";
import { demoPassword, fenwold, idOf, larkmoor, people, viewerOf, type DemoFirm } from "./identities";
import { plannedJobs } from "./plan";
import { demoRecord } from "./records";
import { hashPassword } from "@/lib/server/auth/passwords";

type Step = { name: string; at: string; run: () => Promise<void> };

const doneKey = (name: string) => `demo seed: ${name}`;

/** Which steps an earlier run has done, so that one cut short goes on where it stopped. */
async function stepsDone(): Promise<Set<string>> {
  const rows = await asFirmId(fenwold.id, (tx) =>
    tx
      .select({ key: idempotencyKeys.key })
      .from(idempotencyKeys)
      .where(and(eq(idempotencyKeys.firmId, fenwold.id), eq(idempotencyKeys.act, "demo.seed"))),
  );
  return new Set(rows.map(({ key }) => key));
}

const noteDone = (name: string) =>
  asFirmId(fenwold.id, (tx) =>
    tx
      .insert(idempotencyKeys)
      .values({ firmId: fenwold.id, key: doneKey(name), act: "demo.seed", requestHash: "", reply: true })
      .onConflictDoNothing(),
  );

async function makeFirm(firm: DemoFirm, passwordHash: string): Promise<void> {
  await asFirmId(firm.id, async (tx) => {
    const made = await tx.insert(firms).values(firm).onConflictDoNothing().returning({ id: firms.id });
    if (made.length === 0) return;
    const program = { firmId: firm.id, userId: null, name: "Sealwire" };
    const staff = people.filter((each) => each.firm.id === firm.id);
    for (const { key, email, name, roles, registration } of staff) {
      const userId = idOf(`person ${key}`);
      await tx.insert(users).values({ id: userId, email, name, passwordHash }).onConflictDoNothing();
      await tx.insert(members).values({ firmId: firm.id, userId, roles, registration });
    }
    await recordEvent(tx, program, { type: "firm.created", version: 1, name: firm.name });
    for (const { key, name, roles } of staff)
      await recordEvent(tx, program, { type: "member.joined", version: 1, userId: idOf(`person ${key}`), name, roles });
  });
}

const settings = {
  operatorId: "17",
  noticeEmail: "notices@ssen.example.com",
  applicationEmail: "connections@ssen.example.com",
  phone: "01632 960144",
  page: null,
  noticeDays: null,
  buriedSeparationM: 4,
  note: "The connections desk answers before ten.",
};

/** Everything the demo tells, each step at its own time; done in the order of time, as it would have happened. */
function steps(today: string): Step[] {
  const list: Step[] = [
    {
      name: "settings",
      at: instantBefore(today, 97, "09:00"),
      run: async () => void (await saveOperatorSettings(viewerOf("nia"), settings)),
    },
  ];
  for (const [index, job] of plannedJobs.entries()) {
    const minute = String(index % 60).padStart(2, "0");
    // The ledger numbers jobs in the order they are opened: none is opened after one with a higher number.
    const opened = Math.max(...plannedJobs.slice(index).map((later) => later.opened));
    const onSite = job.day < 0 ? opened : Math.min(opened, job.day);
    const open = { name: `open ${job.number}`, at: instantBefore(today, opened, `06:${minute}`) };
    const photos = { name: `photos ${job.number}`, at: instantBefore(today, onSite, `07:${minute}`) };
    list.push({ ...open, run: () => openJob(job, today) }, { ...photos, run: () => takePhotos(job) });
    for (const [turn, act] of job.acts.entries())
      list.push({
        name: `${job.number} ${turn} ${act.act}`,
        at: instantBefore(today, act.ago, `${String(8 + (turn % 6)).padStart(2, "0")}:${minute}`),
        run: () => doAct(job, act),
      });
  }
  return list.sort((one, other) => (one.at < other.at ? -1 : one.at > other.at ? 1 : 0));
}

/** A second firm, so that it can be seen that neither sees the other. */
/** The second firm's two jobs: their own places and people, so that nothing of the first firm's can be mistaken for it. */
async function seedLarkmoor(today: string): Promise<void> {
  const own = [
    { like: 147, number: 31, place: ["6 Gorse Terrace", "Saltmere", "XA1 6GT"], customer: "Bea Trevanion" },
    { like: 146, number: 32, place: ["40 Pinfold Road", "Saltmere", "XA1 7PR"], customer: "Ivo Marsh" },
  ] as const;
  for (const { like, number, place, customer } of own) {
    const job = plannedJobs.find((planned) => planned.number === like);
    if (!job) throw new Error(`demo seed, second firm: no job ${like} to follow`);
    const id = idOf(`larkmoor ${number}`);
    const record = demoRecord({ ...job, operator: "12", number, place: [...place], customer }, today);
    const opened = await createJob(viewerOf("pim"), { id, saveId: id, record });
    if (!opened.ok) throw new Error(`demo seed, second firm: ${opened.error.message}`);
  }
}

export type Seeded = { steps: number; skipped: number };

/** Makes the demo, once. Run again it does only what is not there yet; a finished demo is left alone. */
export async function seed(): Promise<Seeded> {
  const today = dayToday();
  const [known] = await db.select({ id: users.id }).from(users).limit(1);
  const passwordHash = known ? "" : await hashPassword(demoPassword);
  if (!known)
    for (const firm of [fenwold, larkmoor])
      await atTime(instantBefore(today, 98, "09:00"), () => makeFirm(firm, passwordHash));
  const done = await stepsDone();
  const open = steps(today).filter(({ name }) => !done.has(doneKey(name)));
  for (const { name, at, run } of open) {
    await atTime(at, run);
    await noteDone(name);
  }
  if (!done.has(doneKey("larkmoor"))) {
    await atTime(instantBefore(today, 5, "10:00"), () => seedLarkmoor(today));
    await noteDone("larkmoor");
  }
  return { steps: open.length, skipped: done.size };
}
