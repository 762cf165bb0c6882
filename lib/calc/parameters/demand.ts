import { parameter } from "../parameter";
import { since2018 } from "./wiring-edition";

/** Household allowances, each a share of rated current unless an ampere is named. */
export type HouseholdAllowances = {
  lightingShare: number;
  heatingFirstA: number;
  heatingRestShare: number;
  cookingFirstA: number;
  cookingRestShare: number;
  cookingSocketA: number;
  waterHeaterRestShare: number;
  standardCircuitRestShare: number;
  socketOutletRestShare: number;
};

export const householdAllowances = parameter<HouseholdAllowances>({
  id: "demand.household-allowances",
  unit: "share or A",
  meaning: "Allowances for diversity in an individual household.",
  values: since2018(
    {
      lightingShare: 0.66,
      heatingFirstA: 10,
      heatingRestShare: 0.5,
      cookingFirstA: 10,
      cookingRestShare: 0.3,
      cookingSocketA: 5,
      waterHeaterRestShare: 0.25,
      standardCircuitRestShare: 0.4,
      socketOutletRestShare: 0.4,
    },
    "IET On-Site Guide appendix A",
    "seen",
  ),
});

export const loggerDaysAtLeast = parameter({
  id: "demand.logger-days",
  unit: "days",
  meaning: "Shortest logging that is taken as evidence of a phase's demand.",
  values: since2018(7, "Own proposal", "derived"),
});

export const loggerResolutionS = parameter({
  id: "demand.logger-resolution",
  unit: "s",
  meaning: "Coarsest step of a logger that is taken as evidence.",
  values: since2018(60, "Own proposal", "derived"),
});

export const halfHourDaysAtLeast = parameter({
  id: "demand.half-hour-days",
  unit: "days",
  meaning: "Half-hourly data that counts as twelve months.",
  values: since2018(365, "Own proposal", "derived"),
});

export const halfHourCoverage = parameter({
  id: "demand.half-hour-coverage",
  unit: "share",
  meaning: "Share of the half hours in the period that must be present.",
  values: since2018(0.99, "Own proposal", "derived"),
});

export const leastChargingA = parameter({
  id: "demand.least-charging-current",
  unit: "A",
  meaning: "Least current a charging vehicle can be offered; below it charging pauses.",
  values: since2018(6, "IEC 61851-1", "from memory: verify"),
});
