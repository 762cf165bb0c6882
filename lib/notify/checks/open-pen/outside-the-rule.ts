import { absent, supplyEarthing } from "../facts";
import { cannotTell, met, notMet, rule } from "../rule";
import type { MethodRule } from "./finding";

/** Methods that take the chargepoint out of the PME rule altogether. */
export const indoorUse: MethodRule = {
  about: rule({
    id: "open-pen.indoor",
    group: "open-pen",
    title: "Indoor use: unit and vehicle",
    reads: ["chargepoints[].location"],
    sources: ["BS 7671 722.411.4.1"],
    gives: ["met", "not-met", "cannot-tell"],
  }),
  find: ({ unit }) => {
    const { location } = unit;
    const used = { location };
    if (location === null)
      return { answer: cannotTell("Where the unit and the vehicle stand is not recorded.", { used }) };
    if (location === "indoor")
      return {
        answer: met("Unit and vehicle are both recorded as indoors.", { used, recorded: "indoor" }),
        residualRisk: "It holds only while no vehicle is charged outdoors from this unit.",
      };
    const where = location === "outdoor" ? "the unit outdoors" : "the vehicle outdoors";
    return {
      answer: notMet(`The method is indoor use, but the record places ${where}.`, { used, recorded: location }),
    };
  },
};

export const privateTnS: MethodRule = {
  about: rule({
    id: "open-pen.private-tn-s",
    group: "open-pen",
    title: "TN-S from the customer's own transformer",
    reads: ["supply.earthing", "supply.earthingConfirmedPrivate"],
    sources: ["BS 7671 722.411.4.1"],
    gives: ["met", "not-met", "cannot-tell"],
  }),
  find: ({ job }) => {
    const earthing = supplyEarthing(job);
    const confirmed = job.supply.earthingConfirmedPrivate;
    const used = { earthing, earthingConfirmedPrivate: confirmed };
    if (earthing === null)
      return { answer: cannotTell(`The earthing of the supply ${absent(job.supply.earthing)}.`, { used }) };
    if (earthing !== "TN-S")
      return {
        answer: notMet(`The method is a private TN-S supply, but the supply is recorded as ${earthing}.`, { used }),
      };
    if (confirmed === true)
      return {
        answer: met("TN-S is confirmed as coming from the customer's own transformer.", {
          used,
          recorded: "TN-S, private",
        }),
      };
    if (confirmed === false)
      return {
        answer: notMet(
          "The method is a private TN-S supply, but it is recorded as not the customer's own: it is taken as PME.",
          { used },
        ),
      };
    return {
      answer: cannotTell(
        "Whether the TN-S supply is the customer's own is not recorded; it is taken as PME until then.",
        { used },
      ),
    };
  },
};

export const separation: MethodRule = {
  about: rule({
    id: "open-pen.separation",
    group: "open-pen",
    title: "Electrical separation, one vehicle to each source",
    reads: ["chargepoints[].outlets"],
    sources: ["BS 7671 722.413.1.2"],
    gives: ["not-met", "cannot-tell"],
  }),
  find: ({ unit }) => {
    const { outlets } = unit;
    const used = { outlets };
    if (outlets !== null && outlets > 1)
      return {
        answer: notMet(`The method is separation, but the unit has ${outlets} outlets: one vehicle to each source.`, {
          used,
          recorded: `${outlets} outlets`,
          limit: "1 outlet",
        }),
      };
    return {
      answer: cannotTell("The isolating transformer and its certificate have to be looked at by a competent person.", {
        used,
      }),
    };
  },
};
