import { and, desc, eq } from "drizzle-orm";
import { londonDay, nowInstant } from "../clock";
import { createJob, getJob } from "../queries/jobs";
import { buildPack } from "../queries/pack-build";
import { sealPack } from "../queries/packs";
import { addPhoto } from "../queries/photos";
import { approveReview, returnReview } from "../queries/reviews";
import { recordMove, recordNote, recordSent } from "../queries/submissions";
import { reviews, submissions } from "../schema";
import { asFirm } from "../tenant";
import { fenwold, idOf, viewerOf } from "./identities";
import { demoPhoto } from "./photo-files";
import type { Act, PlannedJob } from "./cases";
import { demoRecord } from "./records";
import { addDays } from "@/lib/notify/calendar";
import type { Result } from "@/lib/notify/result";
import type { Viewer } from "@/lib/server/auth/viewer";

/** What a person of the firm does at the desk; the installer's own acts are the installer's. */
const admin = () => viewerOf("nia");
const compliance = () => viewerOf("edda");

/** The seed's acts must succeed: a refusal means the plan and the rules no longer agree. */
function must<T>(what: string, result: Result<T>): T {
  if (result.ok) return result.value;
  const { code, message, fields } = result.error;
  throw new Error(`demo seed, ${what}: ${code}, ${message} ${JSON.stringify(fields ?? [])}`);
}

const jobIdOf = ({ number }: PlannedJob) => idOf(`job ${number}`);
const declaration =
  "I did or supervised this work, and what is recorded here is what I saw, tested and set. Where I could not tell, it says so. I left covers and seals on the operator’s equipment as I found them.";

/** Opens the job as its installer would. */
export async function openJob(job: PlannedJob, today: string): Promise<void> {
  const viewer = viewerOf(job.installer);
  const id = jobIdOf(job);
  const record = demoRecord(job, today);
  must(`open ${job.number}`, await createJob(viewer, { id, saveId: id, record }));
}

/** Adds the job's photos, a minute apart. */
export async function takePhotos(job: PlannedJob): Promise<void> {
  const viewer = viewerOf(job.installer);
  for (const [index, subject] of job.photos.entries()) {
    const photo = {
      jobId: jobIdOf(job),
      photoId: idOf(`photo ${job.number} ${subject}`),
      subject,
      of: null,
      caption: null,
      bytes: await demoPhoto(subject),
      takenAt: new Date(Date.parse(nowInstant()) + index * 60_000).toISOString(),
    };
    must(`photo of ${job.number}`, await addPhoto(viewer, photo));
  }
}

const newestPaper = async (viewer: Viewer, jobId: string) => {
  const [paper] = await asFirm(viewer, (tx) =>
    tx
      .select()
      .from(submissions)
      .where(and(eq(submissions.firmId, viewer.firmId), eq(submissions.jobId, jobId)))
      .orderBy(desc(submissions.createdAt))
      .limit(1),
  );
  if (!paper) throw new Error(`job ${jobId} has no paper to move`);
  return paper;
};

const newestReview = async (viewer: Viewer, jobId: string) => {
  const [review] = await asFirm(viewer, (tx) =>
    tx
      .select({ reviewId: reviews.id, version: reviews.version })
      .from(reviews)
      .where(and(eq(reviews.firmId, viewer.firmId), eq(reviews.jobId, jobId), eq(reviews.state, "waiting"))),
  );
  if (!review) throw new Error(`job ${jobId} has no review waiting`);
  return review;
};

const doers: { [A in Act["act"]]: (job: PlannedJob, act: Extract<Act, { act: A }>) => Promise<void> } = {
  seal: async (job, act) => {
    const viewer = viewerOf(job.installer);
    const jobId = jobIdOf(job);
    const { version } = must("read", await getJob(viewer, { jobId }));
    const packId = idOf(`pack ${job.number} ${act.ago}`);
    const input = { jobId, packId, expectedVersion: version, gapsReason: act.gaps ?? null };
    const said = { name: viewer.name, statement: declaration };
    must(`seal ${job.number}`, await sealPack(viewer, { ...input, declaration: said }));
    await buildPack(packId, fenwold.id);
  },
  sent: async (job, act) => {
    const { id, version, packId } = await newestPaper(admin(), jobIdOf(job));
    const sentTo = act.by === "e-mail" ? `connections-${job.operator}@example.com` : null;
    const input = { submissionId: id, version, packId, channel: act.by, sentOn: londonDay(nowInstant()), sentTo };
    must(`send ${job.number}`, await recordSent(admin(), { ...input, note: null }));
  },
  move: async (job, act) => {
    const { id, version } = await newestPaper(admin(), jobIdOf(job));
    const on = londonDay(nowInstant());
    const expires = act.expiresIn === undefined ? null : addDays(on, act.ago + act.expiresIn);
    const input = { submissionId: id, version, to: act.to, on, expires, limitA: act.limitA ?? null };
    const words = { reference: act.reference ?? null, note: act.note ?? null, spokeTo: null };
    must(`${act.to} on ${job.number}`, await recordMove(admin(), { ...input, ...words }));
  },
  call: async (job, { spokeTo, text }) => {
    const { id } = await newestPaper(admin(), jobIdOf(job));
    must(`call on ${job.number}`, await recordNote(admin(), { submissionId: id, kind: "call", text, spokeTo }));
  },
  approve: async (job) => {
    const review = await newestReview(compliance(), jobIdOf(job));
    must(`approve ${job.number}`, await approveReview(compliance(), { ...review, note: null }));
  },
  return: async (job, { reason }) => {
    const review = await newestReview(compliance(), jobIdOf(job));
    must(`return ${job.number}`, await returnReview(compliance(), { ...review, reason }));
  },
};

/** Does one act of the plan. Throws when the data layer refuses it. */
export const doAct = (job: PlannedJob, act: Act): Promise<void> =>
  (doers[act.act] as (job: PlannedJob, act: Act) => Promise<void>)(job, act);
