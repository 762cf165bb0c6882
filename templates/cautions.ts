import { standingCaution } from "@/lib/notify/cautions";
import type { Job } from "@/lib/notify/job";
import type { Block } from "./model";

/** Cautions where work can hurt. The same words wherever they stand. */
export const leaveSealsCaution: Block = {
  kind: "caution",
  title: "Never draw the cut-out fuse or break a seal",
  text: standingCaution,
};

/** Rises with each job whose earthing a later tap, light or socket could undo. */
export const laterMetalworkCaution = (reachM: string): Block => ({
  kind: "caution",
  title: `Ask before adding metalwork within ${reachM} of where the vehicle stands`,
  text: "A metal tap, light, gate or socket added later can bring another earth within reach. What is written here then no longer holds. Have a competent person look at the earthing again.",
});

export const notBeforeAcceptance: Block = {
  kind: "caution",
  title: "Do not energise before acceptance",
  text: "The unit can supply electricity back. It stays switched off until the network operator has accepted it in writing.",
};

/** The emergency line by territory. Northern Ireland has a number of its own, which is on the bill. */
export const emergencyLine = (territory: Job["site"]["territory"]): string =>
  territory === "northern-ireland" ? "the emergency number on the electricity bill" : "105";
