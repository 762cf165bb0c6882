import { parameter } from "@/lib/calc/parameter";

/** The day the Regulations came into force; a sale before it is outside them. */
const inForce = "2022-06-30";
const statedFrom = "2020-01-01";

export const smartChargingFrom = parameter({
  id: "settings.in-force",
  unit: "day",
  meaning: "First day of sale to which the Regulations apply.",
  values: [{ from: "2000-01-01", value: inForce, source: "SI 2021/1467 reg 3", certainty: "seen" }],
});

export const securityFrom = parameter({
  id: "settings.schedule-1-from",
  unit: "day",
  meaning: "First day of sale to which the security requirements of Schedule 1 apply.",
  values: [{ from: "2000-01-01", value: "2022-12-30", source: "govuk-smart-chargepoints", certainty: "seen" }],
});

export const rapidKw = parameter({
  id: "settings.rapid-power",
  unit: "kW",
  meaning: "Power from which a chargepoint is rapid, and so outside the Regulations; just below it is inside.",
  values: [{ from: inForce, value: 50, source: "SI 2021/1467 reg 3", certainty: "seen" }],
});

export type PeakBand = { from: string; to: string };

export const peakHours = parameter<readonly PeakBand[]>({
  id: "settings.peak-hours",
  unit: "clock time, Europe/London, Monday to Friday",
  meaning: "Hours in which a default must not charge. Bank holidays are not excepted in any source read.",
  values: [
    {
      from: inForce,
      value: [
        { from: "08:00", to: "11:00" },
        { from: "16:00", to: "22:00" },
      ],
      source: "smart-chargepoint-notes regulation 10",
      certainty: "seen",
    },
  ],
});

export const delayCapabilityS = parameter({
  id: "settings.delay-capability",
  unit: "s",
  meaning: "Random delay that the unit must be capable of.",
  values: [{ from: inForce, value: 1800, source: "smart-chargepoint-notes regulation 11", certainty: "seen" }],
});

export const delayDefaultS = parameter({
  id: "settings.delay-default",
  unit: "s",
  meaning: "Longest random delay with which the unit operates as delivered.",
  values: [{ from: inForce, value: 600, source: "smart-chargepoint-notes regulation 11", certainty: "seen" }],
});

export const delayStepS = parameter({
  id: "settings.delay-step",
  unit: "s",
  meaning: "Steps to which the random delay is determined.",
  values: [{ from: inForce, value: 1, source: "smart-chargepoint-notes regulation 11", certainty: "seen" }],
});

export const historyMonths = parameter({
  id: "settings.history",
  unit: "months",
  meaning: "Use that the owner can view.",
  values: [{ from: inForce, value: 12, source: "smart-chargepoint-notes regulation 9", certainty: "seen" }],
});

export const powerEveryS = parameter({
  id: "settings.power-every",
  unit: "s",
  meaning: "How often the unit can measure its power.",
  values: [{ from: inForce, value: 1, source: "smart-chargepoint-notes regulation 9", certainty: "seen" }],
});

export const accuracyPercent = parameter({
  id: "settings.accuracy",
  unit: "%",
  meaning: "Accuracy of the measurement, at worst.",
  values: [{ from: inForce, value: 10, source: "smart-chargepoint-notes regulation 9", certainty: "seen" }],
});

export const registerYears = parameter({
  id: "settings.register-years",
  unit: "years",
  meaning: "Years for which a row of the register of sales is kept, counted from the sale.",
  values: [{ from: inForce, value: 10, source: "smart-chargepoint-notes regulation 14", certainty: "seen" }],
});

export const buildingControlDays = parameter({
  id: "building-control.days",
  unit: "calendar days",
  meaning: "Days after completion for the certificate to the occupier and the notice to the local authority.",
  values: [{ from: statedFrom, value: 30, source: "SI 2010/2214 reg 20", certainty: "seen" }],
});
