import type { Grounds, OwnFigureName, OwnOperator } from "./firm-rules";
import type { Assessment, DemandRoute } from "./assessment";
import type { Job } from "./job";
import type { Role } from "./roles";
import type { ReviewState } from "./review";
import type { SubmissionChannel, SubmissionPurpose, SubmissionState } from "./submission";

/**
 * What the data layer hands to a screen: named fields only, dates as `YYYY-MM-DD`, instants as UTC ISO text.
 * The same types are the responses of the route handlers.
 */

export type Eyelet = "job" | "assessment" | "pack" | "submission" | "review";
export type EyeletStanding = {
  name: Eyelet;
  standing: "passed" | "now" | "ahead" | "stopped";
  state: string;
  hash8: string | null;
};
/** The five eyelets of a job, in order. */
export type ThreadView = readonly EyeletStanding[];

export type JobRow = {
  id: string;
  number: string;
  stage: Job["stage"];
  /** First line and town, "4 Ropewalk Lane, Oxcombe"; "No address yet" when there is none. */
  site: string;
  postcode: string | null;
  operatorId: string;
  operatorName: string;
  /** "Kestrel Dock 7", or "2 chargepoints". */
  unit: string;
  route: DemandRoute;
  standing: JobStanding;
  installerName: string | null;
  installedOn: string | null;
  plannedOn: string | null;
  lastDay: string | null;
  missingCount: number;
  version: number;
  updatedAt: string;
};
/** Where a job stands, furthest eyelet reached. */
export type JobStanding =
  "recording" | "ready-to-seal" | "sealing" | "sealed" | "sent" | "answered" | "closed" | "returned" | "stopped";

export type Page<T> = {
  rows: T[];
  /** Cursor of the next page, null at the end. */ next: string | null;
  total: number;
};

export type JobFilter = {
  q: string | null;
  stage: Job["stage"] | null;
  standing: JobStanding | null;
  operatorId: string | null;
  route: DemandRoute | null;
  installerId: string | null;
  sort: "last-day" | "updated" | "number";
  after: string | null;
};

export type JobView = {
  id: string;
  number: string;
  version: number;
  record: Job;
  installerId: string | null;
  installerName: string | null;
  createdAt: string;
  updatedAt: string;
  updatedBy: string | null;
  thread: ThreadView;
  photos: PhotoView[];
  /** A job of this firm with the same supply number and a chargepoint of the same serial, if there is one. */
  duplicateOf: { id: string; number: string } | null;
};

export type PhotoView = {
  id: string;
  file: string;
  subject: string;
  of: string | null;
  caption: string | null;
  takenAt: string | null;
  widthPx: number;
  heightPx: number;
  bytes: number;
  inPack: boolean;
  url: string;
};

/** One changed fact: where, what it was when the person began, what it is to be. */
export type Change = { path: string; was: unknown; value: unknown };
export type SaveRequest = { saveId: string; baseVersion: number; changes: Change[] };
export type SaveReply =
  | { saved: true; version: number; savedAt: string; assessment: AssessmentSummary }
  | { saved: false; reason: "conflict"; version: number; conflicts: Conflict[]; changedBy: string | null };
export type Conflict = { path: string; was: unknown; yours: unknown; theirs: unknown };

export type AssessmentSummary = {
  /** Null with `fields` when the record contradicts itself and cannot be assessed. */
  route: DemandRoute | null;
  headline: string;
  missing: { path: string; needed: string }[];
  lastDay: string | null;
  daysLeft: number | null;
  fields: { path: string; message: string }[];
};
export type AssessmentView = { id: string; jobVersion: number; createdAt: string; body: Assessment };

export type PackStatus = "building" | "sealed" | "failed";
export type PackView = {
  id: string;
  jobId: string;
  jobNumber: string;
  version: number;
  status: PackStatus;
  /** 0 to 100 while building, with the step in words. */
  progress: number;
  step: string;
  sha256: string | null;
  bytes: number | null;
  issuedAt: string;
  sealedBy: string;
  ruleset: string;
  gapsReason: string | null;
  changes: { path: string; was: unknown; now: unknown }[];
  files: { name: string; bytes: number; sha256: string }[];
  error: string | null;
  supersededBy: number | null;
};

export type SubmissionRow = {
  id: string;
  jobId: string;
  jobNumber: string;
  site: string;
  operatorId: string;
  operatorName: string;
  purpose: SubmissionPurpose;
  state: SubmissionState;
  channel: SubmissionChannel | null;
  packId: string | null;
  packVersion: number | null;
  packHash8: string | null;
  sentOn: string | null;
  workingDaysSinceSent: number | null;
  /** The day the next step falls, or the last day to send. */
  dueOn: string | null;
  daysLeft: number | null;
  nextStep: string;
  reference: string | null;
  version: number;
};
export type SubmissionEntry = {
  id: string;
  at: string;
  kind: "sent" | "reply" | "call" | "note" | "move";
  text: string;
  reference: string | null;
  by: string;
  state: SubmissionState;
};
export type SubmissionView = SubmissionRow & {
  history: SubmissionEntry[];
  packs: { id: string; version: number; hash8: string }[];
  moves: {
    to: SubmissionState;
    label: string;
    needs: ("reference" | "decision-day" | "limit" | "note" | "expires")[];
  }[];
  sendTo: { email: string | null; page: string | null };
  draft: { subject: string; body: string };
};
export type SubmissionFilter = {
  tab:
    | "needs-someone"
    | "past-last-day"
    | "not-sent"
    | "no-acknowledgement"
    | "question"
    | "chase-due"
    | "offer-open"
    | "waiting"
    | "closed"
    | "all";
  q: string | null;
  operatorId: string | null;
  purpose: SubmissionPurpose | null;
  after: string | null;
};

export type ReviewRow = {
  id: string;
  jobId: string;
  jobNumber: string;
  site: string;
  unit: string;
  state: ReviewState;
  waitingWorkingDays: number;
  tally: Record<"met" | "not-met" | "cannot-tell" | "not-applicable", number>;
};
export type ReviewView = ReviewRow & {
  version: number;
  packId: string;
  packHash8: string | null;
  job: Job;
  assessment: Assessment;
  photos: PhotoView[];
  thread: ThreadView;
  recordedBy: string | null;
  decidedBy: string | null;
  decidedAt: string | null;
  reason: string | null;
};

export type MemberView = {
  userId: string;
  name: string;
  email: string;
  roles: Role[];
  registration: string | null;
  status: "active" | "suspended";
  lastSeenAt: string | null;
};
export type InvitationView = { id: string; email: string; roles: Role[]; expiresAt: string; invitedBy: string };
export type SessionView = { id: string; current: boolean; createdAt: string; lastSeenAt: string; device: string };

export type EventView = {
  id: string;
  at: string;
  actor: string;
  type: string;
  sentence: string;
  jobId: string | null;
  jobNumber: string | null;
  hash8: string;
};

export type OperatorSettings = {
  operatorId: string;
  noticeEmail: string | null;
  applicationEmail: string | null;
  phone: string | null;
  page: string | null;
  /** Days after installing for the notice, 0 for by the day of installing; null keeps the register's rule. */
  noticeDays: number | null;
  /** Distance the operator asks between buried electrodes, metres; null when not set. */
  buriedSeparationM: number | null;
  /** Demand of a dwelling above which the operator is asked first, amps a phase; null keeps the register's rule. */
  asksFirstAboveA: number | null;
  /** Fuse the operator refits cut-outs with, amps; null keeps the register's rule. */
  assumesFuseA: number | null;
  /** By figure: the day it holds from, its source, the day it was set. */
  grounds: Grounds;
  note: string | null;
};

/** One operator of the register, what the firm has set for it, and how many of the firm's papers it has to answer. */
export type OperatorRow = {
  id: string;
  name: string;
  area: string;
  group: string;
  kind: "dno" | "idno" | "ni";
  /** Whose bank holidays count; null where the site decides. */
  division: string | null;
  /** Day and source of the register's entry. */
  from: string;
  source: string;
  /** Where notices go while the firm has set nothing; null where nothing is known. */
  noticeMailbox: string | null;
  applicationMailbox: string | null;
  /** What the register says today of each figure that a firm may set, in words, with the figure where it holds one. */
  register: Record<OwnFigureName, { value: number | null; words: string }>;
  /** The firm's own entry of an operator that the register lacks; null for one of the register. */
  own: OwnOperator | null;
  openPapers: number;
  openJobs: number;
  settings: OperatorSettings;
};

/** Counts beside the contents list. */
export type Counts = {
  today: number;
  jobs: number;
  submissions: number;
  reviews: number;
  operators: number;
  team: number;
};

export type TodayView = {
  installer: {
    jobs: JobRow[];
    returned: { jobId: string; jobNumber: string; site: string; reason: string; by: string; at: string }[];
  } | null;
  admin: { unsent: SubmissionRow[]; late: SubmissionRow[]; unanswered: SubmissionRow[] } | null;
  compliance: { waiting: ReviewRow[] } | null;
};
