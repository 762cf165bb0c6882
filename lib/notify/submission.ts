/** The life of one paper sent to an operator. Silence never approves: no move leads from silence to approved. */
export const submissionPurposes = [
  "demand-notice",
  "application",
  "completion-notice",
  "generation-notice",
  "generation-application",
  "safety-report",
] as const;
export type SubmissionPurpose = (typeof submissionPurposes)[number];

export const submissionChannels = ["e-mail", "operator-page", "telephone", "post"] as const;
export type SubmissionChannel = (typeof submissionChannels)[number];

export const submissionStates = [
  "draft",
  "queued",
  "submitted",
  "bounced",
  "acknowledged",
  "question",
  "recorded",
  "approved",
  "approved-with-limit",
  "approved-works-to-follow",
  "works-required",
  "offer-open",
  "refused",
  "withdrawn",
  "closed",
] as const;
export type SubmissionState = (typeof submissionStates)[number];
