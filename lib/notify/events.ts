import { z } from "zod";
import { reviewStateName } from "./review";
import { roleName, roles } from "./roles";
import {
  submissionChannelName,
  submissionChannels,
  submissionPurposeName,
  submissionPurposes,
  submissionStateName,
  submissionStates,
} from "./submission";

const version = { version: z.literal(1) };
const event = <const T extends string, S extends z.ZodRawShape>(type: T, shape: S) =>
  z.object({ type: z.literal(type), ...version, ...shape });

const id = z.string().min(1);
const job = { jobId: id, jobNumber: z.string() };
const pack = { ...job, packId: id, packVersion: z.number().int() };
const paper = { ...job, submissionId: id, purpose: z.enum(submissionPurposes) };
const review = { ...job, reviewId: id };

/** Everything a firm's record of activity may hold. A shape is never changed: a new one takes the next version. */
export const eventSchema = z.discriminatedUnion("type", [
  event("firm.created", { name: z.string() }),
  event("firm.changed", { fields: z.array(z.string()) }),
  event("member.invited", { invitationId: id, email: z.string(), roles: z.array(z.enum(roles)) }),
  event("member.joined", { userId: id, name: z.string(), roles: z.array(z.enum(roles)) }),
  event("member.roles-set", { userId: id, name: z.string(), was: z.array(z.enum(roles)), now: z.array(z.enum(roles)) }),
  event("member.suspended", { userId: id, name: z.string() }),
  event("member.reinstated", { userId: id, name: z.string() }),
  event("invitation.withdrawn", { invitationId: id, email: z.string() }),
  event("account.signed-in", { userId: id }),
  event("account.session-ended", { userId: id, sessionId: id }),
  event("account.password-reset", { userId: id }),
  event("operator.entered", { operatorId: z.string(), operatorName: z.string(), from: z.string(), source: z.string() }),
  event("operator.entry-changed", { operatorId: z.string(), operatorName: z.string(), fields: z.array(z.string()) }),
  event("operator.entry-removed", { operatorId: z.string(), operatorName: z.string() }),
  event("operator.settings-saved", { operatorId: z.string(), operatorName: z.string(), fields: z.array(z.string()) }),
  event("job.created", { ...job, copiedFrom: z.string().nullable() }),
  event("job.saved", { ...job, jobVersion: z.number().int(), paths: z.array(z.string()) }),
  event("job.conflict", { ...job, jobVersion: z.number().int(), paths: z.array(z.string()) }),
  event("photo.added", { ...job, photoId: id, subject: z.string() }),
  event("photo.changed", { ...job, photoId: id, subject: z.string() }),
  event("photo.removed", { ...job, photoId: id, subject: z.string() }),
  event("assessment.made", { ...job, assessmentId: id, route: z.string(), ruleset: z.string() }),
  event("pack.frozen", { ...pack, gapsReason: z.string().nullable() }),
  event("pack.sealed", { ...pack, sha256: z.string() }),
  event("pack.failed", { ...pack, logId: z.string() }),
  event("pack.downloaded", { ...pack }),
  event("submission.drafted", { ...paper, packId: id.nullable() }),
  event("submission.sent", {
    ...paper,
    channel: z.enum(submissionChannels),
    sentTo: z.string().nullable(),
    sentOn: z.string(),
    packId: id.nullable(),
  }),
  event("submission.moved", {
    ...paper,
    from: z.enum(submissionStates),
    to: z.enum(submissionStates),
    reference: z.string().nullable(),
    on: z.string().nullable(),
  }),
  event("submission.noted", { ...paper, kind: z.enum(["call", "note"]), spokeTo: z.string().nullable() }),
  event("review.opened", { ...review, packId: id }),
  event("review.approved", { ...review, packId: id }),
  event("review.returned", { ...review, packId: id, reason: z.string() }),
  event("review.superseded", { ...review, byPackVersion: z.number().int() }),
]);

export type FirmEvent = z.output<typeof eventSchema>;
export type EventType = FirmEvent["type"];

const roleWords = (held: readonly (keyof typeof roleName)[]) =>
  held.length ? held.map((role) => roleName[role].toLowerCase()).join(", ") : "no role";
const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? "" : "s"}`;
const short = (hash: string) => hash.slice(0, 8);

type Sentences = { [T in EventType]: (event: Extract<FirmEvent, { type: T }>) => string };

/** One sentence an event, without its actor and time, which stand beside it on the page. */
const sentences: Sentences = {
  "firm.created": ({ name }) => `Opened the account of ${name}.`,
  "firm.changed": ({ fields }) => `Changed the firm’s ${fields.join(", ")}.`,
  "member.invited": ({ email, roles: held }) => `Invited ${email} as ${roleWords(held)}.`,
  "member.joined": ({ name, roles: held }) => `${name} joined as ${roleWords(held)}.`,
  "member.roles-set": ({ name, was, now }) => `Changed ${name} from ${roleWords(was)} to ${roleWords(now)}.`,
  "member.suspended": ({ name }) => `Suspended ${name}.`,
  "member.reinstated": ({ name }) => `Let ${name} back in.`,
  "invitation.withdrawn": ({ email }) => `Withdrew the invitation to ${email}.`,
  "account.signed-in": () => "Signed in.",
  "account.session-ended": () => "Ended a session.",
  "account.password-reset": () => "Set a new password.",
  "operator.entered": ({ operatorId, operatorName, from, source }) =>
    `Entered ${operatorName} as distributor ${operatorId} from ${from}, which the register lacks (source: ${source}).`,
  "operator.entry-changed": ({ operatorId, operatorName, fields }) =>
    `Changed ${fields.join(", ")} of the firm’s own entry for distributor ${operatorId}, ${operatorName}.`,
  "operator.entry-removed": ({ operatorId, operatorName }) =>
    `Took out the firm’s own entry for distributor ${operatorId}, ${operatorName}.`,
  "operator.settings-saved": ({ operatorName, fields }) => `Changed ${fields.join(", ")} for ${operatorName}.`,
  "job.created": ({ jobNumber, copiedFrom }) =>
    `Opened job ${jobNumber}${copiedFrom ? `, copied from ${copiedFrom}` : ""}.`,
  "job.saved": ({ jobNumber, paths }) => `Recorded ${plural(paths.length, "fact")} on ${jobNumber}.`,
  "job.conflict": ({ jobNumber, paths }) =>
    `${plural(paths.length, "fact")} on ${jobNumber} had been changed by somebody else; both were kept.`,
  "photo.added": ({ jobNumber, subject }) => `Added a photo of the ${subject} to ${jobNumber}.`,
  "photo.changed": ({ jobNumber, subject }) => `Changed a photo of the ${subject} on ${jobNumber}.`,
  "photo.removed": ({ jobNumber, subject }) => `Removed a photo of the ${subject} from ${jobNumber}.`,
  "assessment.made": ({ jobNumber, route, ruleset }) => `Assessed ${jobNumber}: ${route}, rule set ${ruleset}.`,
  "pack.frozen": ({ jobNumber, packVersion, gapsReason }) =>
    `Froze version ${packVersion} of the pack of ${jobNumber}${gapsReason ? ", with gaps stated" : ""}.`,
  "pack.sealed": ({ jobNumber, packVersion, sha256 }) =>
    `Sealed version ${packVersion} of the pack of ${jobNumber}, ${short(sha256)}.`,
  "pack.failed": ({ jobNumber, packVersion, logId }) =>
    `Version ${packVersion} of the pack of ${jobNumber} could not be built. Log entry ${logId}.`,
  "pack.downloaded": ({ jobNumber, packVersion }) => `Downloaded version ${packVersion} of the pack of ${jobNumber}.`,
  "submission.drafted": ({ jobNumber, purpose }) => `${submissionPurposeName[purpose]} for ${jobNumber} made ready.`,
  "submission.sent": ({ jobNumber, purpose, channel, sentTo }) =>
    `${submissionPurposeName[purpose]} for ${jobNumber} sent: ${submissionChannelName[channel].toLowerCase()}${sentTo ? `, ${sentTo}` : ""}.`,
  "submission.moved": ({ jobNumber, purpose, from, to, reference }) =>
    `${submissionPurposeName[purpose]} for ${jobNumber}: from “${submissionStateName[from]}” to “${submissionStateName[to]}”${reference ? `, reference ${reference}` : ""}.`,
  "submission.noted": ({ jobNumber, purpose, kind, spokeTo }) =>
    `${kind === "call" ? "Call" : "Note"} on the ${submissionPurposeName[purpose].toLowerCase()} for ${jobNumber}${spokeTo ? `, spoke to ${spokeTo}` : ""}.`,
  "review.opened": ({ jobNumber }) => `Settings of ${jobNumber} wait for review.`,
  "review.approved": ({ jobNumber }) => `Settings of ${jobNumber}: ${reviewStateName.approved.toLowerCase()}.`,
  "review.returned": ({ jobNumber, reason }) => `Settings of ${jobNumber} returned: ${reason}`,
  "review.superseded": ({ jobNumber, byPackVersion }) =>
    `Review of ${jobNumber} superseded by version ${byPackVersion} of the pack.`,
};

/** What happened, in one sentence. */
export function sentence(happened: FirmEvent): string {
  const say = sentences[happened.type] as (one: FirmEvent) => string;
  return say(happened);
}
