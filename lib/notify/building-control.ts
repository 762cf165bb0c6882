import { valueAt, type IsoDate } from "@/lib/calc/parameter";
import { addDays, longDate } from "./calendar";
import type { JobFacts } from "./job";
import { buildingControlDays } from "./parameters/legislation";
import type { Reason } from "./result";
import { rule } from "./rule";

const source = "SI 2010/2214 reg 20";
const reads = [
  "site.territory",
  "site.premises",
  "kind",
  "circuits",
  "boards[].arrangement",
  "buildingControl",
] as const;

export const buildingControlRoute = rule({
  id: "building-control.route",
  group: "route",
  title: "Building control",
  reads,
  sources: [source, "part-p-notes", "scottish-warrants"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const buildingControlNotice = rule({
  id: "building-control.notice",
  group: "route",
  title: "Certificate to the occupier and notice to the local authority",
  reads: ["buildingControl.notifiedOn", "buildingControl.occupierCopyOn", "dates.completed", "dates.installed"],
  sources: [source],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const isDwelling = ({ site }: JobFacts) => site.premises === "domestic";
const isEnglandOrWales = ({ site }: JobFacts) => site.territory === "england" || site.territory === "wales";

/** A new circuit or a replaced board in a dwelling of England or Wales is notifiable. */
const isNotifiable = (job: JobFacts) =>
  isEnglandOrWales(job) &&
  isDwelling(job) &&
  (job.kind === "new" || job.boards.some(({ arrangement }) => arrangement === "replaced"));

/** Whether the 30 days run: notifiable work that nobody has recorded as not notifiable. */
export const isBuildingControlDue = (job: JobFacts): boolean =>
  isNotifiable(job) && job.buildingControl.route !== "not-notifiable";

/** What building control asks of this work, by territory. `done` is the day of completion, null while planned. */
export function buildingControlChecks(job: JobFacts, done: IsoDate | null): Reason[] {
  return [routeCheck(job), noticeCheck(job, done)];
}

function routeCheck(job: JobFacts): Reason {
  const { route } = job.buildingControl;
  const { territory, premises, building } = job.site;
  const detail = { used: { territory, premises, route }, recorded: route };
  if (territory === null || premises === null)
    return buildingControlRoute.says("cannot-tell", "Territory or premises are not recorded.", detail);
  if (territory === "scotland") return scottish(job, detail);
  if (territory === "northern-ireland")
    return buildingControlRoute.says(
      "not-applicable",
      "No notice of electrical work to building control was found for Northern Ireland.",
      detail,
    );
  if (!isDwelling(job))
    return buildingControlRoute.says(
      "not-applicable",
      "Part P is for dwellings and what is supplied from them.",
      detail,
    );
  if (!isNotifiable(job))
    return building === null || territory === "wales"
      ? buildingControlRoute.says(
          "cannot-tell",
          "Work on an existing circuit: compare it with the list of notifiable work for this territory.",
          detail,
        )
      : buildingControlRoute.says(
          "not-applicable",
          "Work on an existing circuit is not notifiable outside special locations.",
          detail,
        );
  if (route === "not-notifiable" || route === "warrant")
    return buildingControlRoute.says(
      "not-met",
      "A new circuit or a replaced board in a dwelling is notifiable, and the record says otherwise.",
      detail,
    );
  return route === null || route === "unknown"
    ? buildingControlRoute.says(
        "cannot-tell",
        "A new circuit or a replaced board in a dwelling is notifiable; by which way is not recorded.",
        detail,
      )
    : buildingControlRoute.says(
        "met",
        "A new circuit or a replaced board in a dwelling is notifiable, and the way is recorded.",
        detail,
      );
}

type Detail = { used: Reason["used"]; recorded: string | null };

function scottish(job: JobFacts, detail: Detail): Reason {
  const { route } = job.buildingControl;
  const sources = { ...detail, sources: ["scottish-warrants"] };
  if (!isDwelling(job) || job.site.building === "house")
    return route === "warrant"
      ? buildingControlRoute.says("met", "A building warrant is recorded.", sources)
      : buildingControlRoute.says(
          "not-applicable",
          "Wiring in a house of up to two storeys generally needs no warrant; taller houses do.",
          sources,
        );
  return route === "warrant"
    ? buildingControlRoute.says("met", "A building warrant is recorded.", sources)
    : buildingControlRoute.says(
        "cannot-tell",
        "In a flat or a taller building a warrant may be needed; the owner must settle it.",
        sources,
      );
}

function noticeCheck(job: JobFacts, done: IsoDate | null): Reason {
  if (!isBuildingControlDue(job))
    return buildingControlNotice.says("not-applicable", "No such notice is due for this work.");
  if (done === null) return buildingControlNotice.says("not-applicable", "The work is not done yet.");
  const days = valueAt(buildingControlDays, done);
  const lastDay = addDays(done, days);
  const { notifiedOn, occupierCopyOn } = job.buildingControl;
  const detail = {
    used: { done, lastDay, notifiedOn, occupierCopyOn },
    limit: `by ${longDate(lastDay)}`,
    recorded: notifiedOn ? longDate(notifiedOn) : null,
  };
  const late = [notifiedOn, occupierCopyOn].filter((day) => day !== null && day > lastDay);
  if (late.length)
    return buildingControlNotice.says(
      "not-met",
      `Later than ${days} days after completion, which ended on ${longDate(lastDay)}.`,
      detail,
    );
  return notifiedOn && occupierCopyOn
    ? buildingControlNotice.says("met", `Certificate to the occupier and notice by ${longDate(lastDay)}.`, detail)
    : buildingControlNotice.says(
        "cannot-tell",
        `Certificate to the occupier and notice are due by ${longDate(lastDay)}; not both are recorded.`,
        detail,
      );
}
