import { entryAt } from "@/lib/calc/parameter";
import type { JobFacts } from "../job";
import { knownNumber } from "../job/facts";
import { lostEarthOhm } from "../parameters/network";
import { ruleDay } from "../rule-day";
import { mark } from "../checks/rule";
import { rule } from "../rule";
import { finding, need, type Finding } from "./finding";

type Condition = NonNullable<JobFacts["supply"]["serviceConditions"]>[number];

/** Conditions of the service position that stop the job, in the words used for them. */
const stopping: Partial<Record<Condition, string>> = {
  "exposed-live": "exposed live parts",
  "heat-marks": "heat marks",
  damaged: "damage",
  tamper: "signs of tampering",
  water: "water",
  "no-earth-found": "no earth found",
};

const doNext =
  "Make safe, leave covers and seals as found, telephone the operator’s emergency line and send one safety report.";

export const serviceDanger = rule({
  id: "route.service-danger",
  group: "route",
  title: "Danger at the service position",
  reads: ["supply.serviceConditions"],
  sources: ["ena-guidance", "npg-lct", "service-fault-categories"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

export const polarityDanger = rule({
  id: "route.polarity",
  group: "route",
  title: "Polarity",
  reads: ["kind", "circuits[].measured.polarityCorrect"],
  sources: ["our-practice"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const earthDanger = rule({
  id: "route.earth-danger",
  group: "route",
  title: "Earth that the supply must not give",
  reads: ["site.premises", "supply.earthing", "chargepoints[].openPen.method"],
  sources: ["SI 2002/2665 reg 9"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

export const impedanceDanger = rule({
  id: "route.impedance-danger",
  group: "route",
  title: "Earth of the supply",
  reads: ["supply.externalLoopImpedanceOhm", "supply.earthing"],
  sources: ["our-practice"],
  outcomes: ["not-met", "cannot-tell", "not-applicable"],
});

/** Conditions recorded at the service position that stop the job, in words. Empty when there are none. */
export const dangersSeen = (job: JobFacts): string[] =>
  (job.supply.serviceConditions ?? []).flatMap((condition) => stopping[condition] ?? []);

function service(job: JobFacts): Finding {
  const seen = dangersSeen(job);
  const recorded = job.supply.serviceConditions?.join(", ") ?? null;
  const used = { serviceConditions: job.supply.serviceConditions };
  if (seen.length === 0 && !job.supply.serviceConditions?.length)
    return finding(
      serviceDanger.says("cannot-tell", "The condition of the service position is not recorded.", { used, recorded }),
      "none",
    );
  if (seen.length === 0)
    return finding(
      serviceDanger.says("met", "No danger is recorded at the service position.", { used, recorded }),
      "none",
    );
  const words = `${seen.join(", ")} at the service position`;
  return finding(
    {
      ...serviceDanger.says("not-met", `${capital(words)} recorded. ${doNext}`, { used, recorded }),
      title: capital(words),
    },
    "stop",
  );
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

function polarity(job: JobFacts): Finding {
  const wrong = job.circuits.filter(({ measured }) => measured.polarityCorrect === false).map(({ id }) => id);
  if (wrong.length)
    return finding(
      {
        ...polarityDanger.says(
          "not-met",
          `Polarity is recorded as wrong on ${wrong.join(", ")}. Make safe, switch off at the installation’s own board, do not energise, and report it.`,
          { used: { circuits: wrong }, recorded: "wrong" },
        ),
        title: "Wrong polarity",
      },
      "stop",
    );
  if (job.stage === "planned" || job.kind === "removal")
    return finding(polarityDanger.says("not-applicable", "No new circuit is there to test."), "none");
  if (job.circuits.length === 0)
    return finding(polarityDanger.says("cannot-tell", "No circuit is recorded, and so no polarity test."), "hold", [
      need("circuits", "the circuit of the chargepoint, with its polarity test"),
    ]);
  const untested = job.circuits.findIndex(({ measured }) => measured.polarityCorrect !== true);
  return untested >= 0
    ? finding(
        polarityDanger.says("cannot-tell", `No polarity test is recorded on ${job.circuits[untested]?.id}.`),
        "hold",
        [need(`circuits[${untested}].measured.polarityCorrect`, "the polarity test")],
      )
    : finding(polarityDanger.says("met", "Polarity is recorded as correct on every circuit."), "none");
}

/** Methods that leave the supply's earth behind at the chargepoint. */
const ownEarth = ["tt", "separation"];

function earth(job: JobFacts): Finding {
  if (job.site.premises !== "caravan-or-boat")
    return finding(earthDanger.says("not-applicable", "The site is not a caravan pitch or a mooring."), "none");
  const { earthing } = job.supply;
  if (earthing === null || earthing === "unknown")
    return finding(
      earthDanger.says("cannot-tell", "The earthing of the supply is not known at this caravan pitch or mooring.", {
        used: { earthing },
      }),
      earthing === null ? "hold" : "apply",
      [need("supply.earthing", "the earthing arrangement of the supply")],
    );
  const onPme = job.chargepoints.filter(
    ({ openPen }) => job.supply.earthing === "TN-C-S" && !ownEarth.includes(openPen.method ?? ""),
  );
  if (onPme.length)
    return finding(
      {
        ...earthDanger.says(
          "not-met",
          "The supply is TN-C-S at a caravan pitch or mooring and the chargepoint keeps its earth. The operator’s earth terminal may not serve there.",
          { used: { earthing: job.supply.earthing, chargepoints: onPme.map(({ id }) => id) } },
        ),
        title: "The operator’s earth at a caravan or boat",
      },
      "stop",
    );
  return finding(
    earthDanger.says("met", "No chargepoint keeps a TN-C-S earth at this caravan pitch or mooring.", {
      used: { earthing: job.supply.earthing },
    }),
    "none",
  );
}

/** A figure from memory: it stops a job and passes none. */
function impedance({ supply, dates, stage }: JobFacts): Finding {
  const lostAt = entryAt(lostEarthOhm, ruleDay(dates));
  const lostAtOhm = lostAt.value;
  const ohm = knownNumber(supply.externalLoopImpedanceOhm);
  const used = { externalLoopImpedanceOhm: ohm, earthing: supply.earthing, lostAtOhm };
  if (supply.earthing === null)
    return finding(
      impedanceDanger.says("cannot-tell", "The earthing of the supply is not recorded.", { used }),
      "hold",
      [need("supply.earthing", "the earthing arrangement of the supply")],
    );
  if (supply.earthing !== "TN-C-S" && supply.earthing !== "TN-S")
    return finding(
      impedanceDanger.says("not-applicable", "The supply is not recorded as TN-C-S or TN-S.", { used }),
      "none",
    );
  if (ohm === null)
    return stage === "planned"
      ? finding(
          impedanceDanger.says("not-applicable", "Not yet: the impedance is found at the intake.", { used }),
          "none",
        )
      : finding(impedanceDanger.says("cannot-tell", "The external loop impedance is not recorded.", { used }), "hold", [
          need("supply.externalLoopImpedanceOhm", "the external loop impedance, measured or declared"),
        ]);
  const detail = { used, recorded: `${ohm} Ω`, limit: `< ${lostAtOhm} Ω${mark(lostAt)}` };
  if (ohm < lostAtOhm)
    return finding(
      impedanceDanger.says(
        "not-applicable",
        `${ohm} Ω outside on a ${supply.earthing} supply does not reach the ${lostAtOhm} Ω from which its earth is taken as lost.`,
        detail,
      ),
      "none",
    );
  const because = `${ohm} Ω outside on a ${supply.earthing} supply: the earth must be taken as lost. ${doNext}`;
  return finding(
    { ...impedanceDanger.says("not-met", because, detail), title: "The earth of the supply must be taken as lost" },
    "stop",
  );
}

/** What outranks every other rule: conditions of the service, polarity, an earth that may not be used or is lost. */
export const dangerFindings = (job: JobFacts): Finding[] => [service(job), polarity(job), earth(job), impedance(job)];
