import type { DemandRoute, Missing } from "./assessment";
import type { JobFacts } from "./job";

/** A fact that the operator's paper asks for although it does not decide the route. */
type PaperFact = {
  path: string;
  needed: string;
  isGiven: (job: JobFacts) => boolean;
  when?: (job: JobFacts) => boolean;
};

const isInstalled = ({ stage }: JobFacts) => stage === "installed";

const paperFacts: readonly PaperFact[] = [
  { path: "site.address", needed: "the address of the site", isGiven: ({ site }) => Boolean(site.address?.length) },
  {
    path: "site.postcode",
    needed: "the postcode, or a grid reference where there is none",
    isGiven: ({ site }) => Boolean(site.postcode ?? site.gridReference ?? site.uprn),
  },
  { path: "customer.name", needed: "the customer’s name", isGiven: ({ customer }) => customer.name !== null },
  { path: "customer.phone", needed: "the customer’s telephone", isGiven: ({ customer }) => customer.phone !== null },
  {
    path: "customer.permission.from",
    needed: "who gave permission for the work",
    isGiven: ({ customer }) => customer.permission.from !== null,
    when: ({ customer }) => customer.interest === "tenant" || customer.interest === "employee-driver",
  },
  { path: "firm.name", needed: "the name of the firm", isGiven: ({ firm }) => firm.name !== null },
  { path: "firm.phone", needed: "the telephone of the firm", isGiven: ({ firm }) => firm.phone !== null },
  { path: "firm.email", needed: "the e-mail address of the firm", isGiven: ({ firm }) => firm.email !== null },
  {
    path: "competentPerson.name",
    needed: "the competent person",
    isGiven: ({ competentPerson }) => competentPerson.name !== null,
  },
  {
    path: "competentPerson.registration",
    needed: "the competent person’s registration",
    isGiven: ({ competentPerson }) => competentPerson.registration !== null,
  },
  {
    path: "dates.planned",
    needed: "the planned day of installing",
    isGiven: ({ dates }) => dates.planned !== null,
    when: (job) => !isInstalled(job),
  },
];

/** What the paper asks of each chargepoint. The serial is known only once the unit is there. */
function unitFacts(job: JobFacts): Missing[] {
  return job.chargepoints.flatMap((unit, index) => {
    const asked = [
      { key: "make", needed: "the maker", isGiven: unit.make !== null },
      { key: "model", needed: "the model", isGiven: unit.model !== null },
      {
        key: "serial",
        needed: "the serial number from the rating plate",
        isGiven: unit.serial !== null || !isInstalled(job),
      },
      { key: "mode", needed: "the charging mode", isGiven: unit.mode !== null },
      { key: "openPen.method", needed: "the open-PEN measure chosen", isGiven: unit.openPen.method !== null },
    ];
    return asked
      .filter(({ isGiven }) => !isGiven)
      .map(({ key, needed }) => ({ path: `chargepoints[${index}].${key}`, needed }));
  });
}

/** Only what a safety report asks, so that nothing delays it. */
const safetyPaths = ["site.address", "customer.phone", "firm.phone"];

/** Facts that the paper of this route asks for and the record does not hold. */
export function paperMissing(job: JobFacts, route: DemandRoute): Missing[] {
  const open = paperFacts.filter(({ isGiven, when }) => (when?.(job) ?? true) && !isGiven(job));
  const asked = route === "stop" ? open.filter(({ path }) => safetyPaths.includes(path)) : open;
  return [...asked.map(({ path, needed }) => ({ path, needed })), ...(route === "stop" ? [] : unitFacts(job))];
}
