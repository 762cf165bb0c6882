import type { Assessment } from "./assessment";
import type { Chargepoint, Job } from "./job";
import type { EvidenceSubject } from "./job/papers";

export type PhotoNeed = {
  subject: EvidenceSubject;
  /** The chargepoint it shows, null for the site. */
  of: string | null;
  /** What to show and why, for the person holding the camera. */
  why: string;
  have: boolean;
};

const lookOnly = "Look only, open nothing.";

type Wanted = { subject: EvidenceSubject; why: string };

/** Of the intake, on every job: what the operator judges a service by. */
const intake: readonly Wanted[] = [
  { subject: "intake", why: `The whole intake: service cable, cut-out, meter, tails, isolator. ${lookOnly}` },
  {
    subject: "cut-out",
    why: `The cut-out straight on with its rating label; it is the evidence of the rating. ${lookOnly}`,
  },
  {
    subject: "service-head",
    why: `The head, close enough to count the cables; that shows whether it is looped. ${lookOnly}`,
  },
  { subject: "earth-terminal", why: `The earth terminal and where its conductor goes. ${lookOnly}` },
];

function ofSite(job: Job, { route }: Assessment): Wanted[] {
  if (route.demand === "stop")
    return [
      {
        subject: "damage",
        why: `What was seen, from a distance; it goes with the safety report. ${lookOnly}`,
      },
    ];
  const wanted = [...intake];
  if (job.site.supplyNumber !== null)
    wanted.push({
      subject: "supply-number",
      why: "The number on the bill, name covered; no check digit protects its last two digits.",
    });
  if (job.stage === "installed")
    wanted.push({ subject: "consumer-unit", why: "The board and its labels, its cover left on." });
  if (job.demand.method === "measured")
    wanted.push({ subject: "load-survey", why: "The logger in place or its summary; the demand rests on it." });
  return wanted;
}

function ofUnit(unit: Chargepoint, job: Job): Wanted[] {
  if (job.stage === "planned") return [];
  const wanted: Wanted[] = [
    { subject: "rating-plate", why: "The rating plate, so that model and serial can be compared." },
    { subject: "chargepoint", why: "The unit on its wall, with its surroundings." },
    ...settings(unit),
  ];
  if (unit.configuredA !== null && unit.configuredA !== unit.ratedA)
    wanted.push({ subject: "limit-setting", why: "The screen of the limit; a lower setting counts only with it." });
  if (unit.discharge.kind !== null && unit.discharge.kind !== "none")
    wanted.push({
      subject: "discharge-setting",
      why: "The setting of discharge and export; it decides the generation path.",
    });
  if (unit.openPen.device.position === "separate")
    wanted.push({ subject: "open-pen-device", why: "The device with its label." });
  if (unit.openPen.electrodeOhm !== null || unit.openPen.method === "tt")
    wanted.push({ subject: "electrode", why: "The electrode, with a measure to other earthed metal." });
  if (unit.openPen.method === "tt")
    wanted.push({ subject: "neighbour-earths", why: "Earthed metal near the car’s reach, next door’s too." });
  return wanted;
}

function settings({ smartCharging }: Chargepoint): Wanted[] {
  if (smartCharging.users === "public" || smartCharging.soldByFirm === false) return [];
  return [
    {
      subject: "default-hours-screen",
      why: "The default hours at handover, with the account name out of the picture.",
    },
    { subject: "delay-screen", why: "The longest random delay as set." },
    { subject: "first-use-prompt", why: "The choice of hours as the owner saw it." },
  ];
}

/** Photos that this job needs by its route, with why, and whether they are there. */
export function photosNeeded(job: Job, assessment: Assessment): PhotoNeed[] {
  const stopped = assessment.route.demand === "stop";
  const has = (subject: EvidenceSubject, of: string | null) =>
    job.evidence.some(
      (photo) => photo.subject === subject && (photo.of === of || (photo.of === null && job.chargepoints.length === 1)),
    );
  const site = ofSite(job, assessment).map((wanted) => ({ ...wanted, of: null, have: has(wanted.subject, null) }));
  if (stopped) return site;
  const units = job.chargepoints.flatMap((unit) =>
    ofUnit(unit, job).map((wanted) => ({ ...wanted, of: unit.id, have: has(wanted.subject, unit.id) })),
  );
  return [...site, ...units];
}
