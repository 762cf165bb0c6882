import type { DemandRoute } from "@/lib/notify/assessment";
import type { JobRow, JobStanding } from "@/lib/notify/views";

/** The route in a word or two, for a table. */
export const routeWord: Record<DemandRoute, string> = {
  notify: "Notify",
  apply: "Apply first",
  "late-application": "Late application",
  "more-facts-needed": "More facts",
  stop: "Stop",
};

/** Where a job stands, in words. */
export const standingWord: Record<JobStanding, string> = {
  recording: "Being recorded",
  "ready-to-seal": "Ready to seal",
  sealing: "Being sealed",
  sealed: "Sealed, not sent",
  sent: "Sent",
  answered: "Answered",
  closed: "Closed",
  returned: "Sent back",
  stopped: "Stopped",
};

export const stageWord: Record<JobRow["stage"], string> = { planned: "Planned", installed: "Installed" };
