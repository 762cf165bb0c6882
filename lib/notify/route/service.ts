import type { IsoDate } from "@/lib/calc/parameter";
import type { OperatorRules } from "../firm-rules";
import type { JobFacts } from "../job";
import { hasTrait } from "../operators";
import { rule } from "../rule";
import { cutOutFinding } from "./cut-out";
import { finding, need, type Finding } from "./finding";

/** R2 to R4, R8 and R13: what is known of the service, before any sum is done. */
export const notLooped = rule({
  id: "route.looped",
  group: "route",
  title: "Service not looped",
  reads: ["supply.looped"],
  sources: ["ena-guidance", "npg-lct"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

function looped({ supply }: JobFacts): Finding {
  const used = { looped: supply.looped };
  const missing = [need("supply.looped", "whether the service is looped, counted from the cables at the head")];
  switch (supply.looped) {
    case null:
      return finding(
        notLooped.says("cannot-tell", "Whether the service is looped is not recorded.", { used }),
        "hold",
        missing,
      );
    case "unknown":
      return finding(
        notLooped.says(
          "cannot-tell",
          "Whether the service is looped could not be told, so the operator is asked first.",
          { used },
        ),
        "apply",
        missing,
      );
    case "no":
      return finding(
        notLooped.says("met", "The service is recorded as not looped.", { used, recorded: "not looped" }),
        "none",
      );
    default: {
      const where = supply.looped === "feeds-neighbour" ? "feeds a neighbour" : "is fed from a neighbour";
      return finding(
        notLooped.says("not-met", `The service ${where}, so the operator is asked first.`, { used, recorded: where }),
        "apply",
      );
    }
  }
}

export const serviceSound = rule({
  id: "route.service-condition",
  group: "route",
  title: "Cut-out and service head sound",
  reads: ["supply.serviceConditions"],
  sources: ["ena-guidance", "npg-lct"],
  outcomes: ["met", "not-met", "cannot-tell", "not-applicable"],
});

const concerns = {
  "pitch-leak": "leaking pitch",
  "asbestos-suspected": "suspected asbestos",
  "other-concern": "another concern",
} as const;

export function conditionFinding({ supply }: JobFacts): Finding {
  const list = supply.serviceConditions;
  const used = { serviceConditions: list };
  const missing = [need("supply.serviceConditions", "the condition of the cut-out and service head")];
  if (!list?.length)
    return finding(
      serviceSound.says("cannot-tell", "The condition of the service is not recorded.", { used }),
      "hold",
      missing,
    );
  const raised = list.flatMap((each) => (each in concerns ? concerns[each as keyof typeof concerns] : []));
  if (raised.length)
    return finding(
      serviceSound.says(
        "not-met",
        `${raised.join(", ")} recorded: the operator is asked first, with a report of what was seen.`,
        {
          used,
          recorded: list.join(", "),
        },
      ),
      "apply",
    );
  if (list.includes("unknown"))
    return finding(
      serviceSound.says(
        "cannot-tell",
        "The condition of the service could not be told, so the operator is asked first.",
        { used },
      ),
      "apply",
      missing,
    );
  return list.every((each) => each === "sound")
    ? finding(
        serviceSound.says("met", "Cut-out and service head are recorded as sound.", { used, recorded: "sound" }),
        "none",
      )
    : finding(serviceSound.says("not-applicable", "Danger is recorded, which outranks this rule.", { used }), "none");
}

export const metered = rule({
  id: "route.metered",
  group: "route",
  title: "Metered supply",
  reads: ["supply.metered"],
  sources: ["ena-guidance", "ukpn-eds-08-5050 table 5-1"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

function meter({ supply }: JobFacts, operatorId: string): Finding {
  const used = { metered: supply.metered };
  if (supply.metered === null)
    return finding(metered.says("cannot-tell", "Whether the supply is metered is not recorded.", { used }), "hold", [
      need("supply.metered", "whether the supply is metered"),
    ]);
  if (supply.metered === true)
    return finding(metered.says("met", "The supply is metered.", { used, recorded: "metered" }), "none");
  if (supply.metered !== false)
    return finding(
      metered.says("cannot-tell", "Whether the supply is metered could not be told, so the operator is asked first.", {
        used,
      }),
      "apply",
    );
  const table = hasTrait(operatorId, "supply-table")
    ? " This operator may accept up to 5 kW on a 25 A supply with a measured management system; telephone it first."
    : "";
  return finding(
    metered.says("not-met", `The supply is unmetered, so the operator is asked first.${table}`, {
      used,
      recorded: "unmetered",
    }),
    "apply",
  );
}

export const connection = rule({
  id: "route.connection",
  group: "route",
  title: "Existing connection, unaltered",
  reads: ["supply.connection"],
  sources: ["ena-lct-form", "npg-lct"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

function connected({ supply }: JobFacts): Finding {
  const used = { connection: supply.connection };
  if (supply.connection === null)
    return finding(
      connection.says("cannot-tell", "Whether the connection is existing, altered or new is not recorded.", { used }),
      "hold",
      [need("supply.connection", "whether the connection exists, is altered or is new")],
    );
  if (supply.connection === "existing")
    return finding(
      connection.says("met", "The connection exists and is not altered.", { used, recorded: "existing" }),
      "none",
    );
  const because =
    supply.connection === "new"
      ? "The connection is new: the form goes with the application for a new connection."
      : "The connection is to be altered, so the operator is asked first.";
  return finding(connection.says("not-met", because, { used, recorded: supply.connection }), "apply");
}

export const ownedByDistributor = rule({
  id: "route.network-owner",
  group: "route",
  title: "Supply straight from the operator’s network",
  reads: ["supply.ownedBy"],
  sources: ["ena-guidance", "our-practice"],
  outcomes: ["met", "not-met", "cannot-tell"],
});

function owner({ supply }: JobFacts): Finding {
  const used = { ownedBy: supply.ownedBy };
  const missing = [need("supply.ownedBy", "whether the supply comes from the distributor or a private network")];
  if (supply.ownedBy === null)
    return finding(
      ownedByDistributor.says("cannot-tell", "Who owns the supply is not recorded.", { used }),
      "hold",
      missing,
    );
  if (supply.ownedBy === "unknown")
    return finding(
      ownedByDistributor.says("cannot-tell", "Who owns the supply could not be told, so the operator is asked first.", {
        used,
      }),
      "apply",
      missing,
    );
  return supply.ownedBy === "distributor"
    ? finding(ownedByDistributor.says("met", "The supply comes from the operator’s network.", { used }), "none")
    : finding(
        ownedByDistributor.says(
          "not-met",
          "The supply comes from a private network: its owner is asked, and applies to the operator for the whole site.",
          { used, recorded: "private network" },
        ),
        "apply",
      );
}

/** What is known of the service, in the order a person meets it at the intake. */
export const serviceFindings = (job: JobFacts, operatorId: string, rules: OperatorRules, on: IsoDate): Finding[] => [
  cutOutFinding(job, operatorId, rules, on),
  looped(job),
  conditionFinding(job),
  meter(job, operatorId),
  connected(job),
  owner(job),
];
