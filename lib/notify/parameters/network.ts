import { parameter } from "@/lib/calc/parameter";

/** First day for which the register holds figures; the oldest case a firm is likely to reopen is younger. */
const registerFrom = "2020-01-01";

export const noticeDays = parameter({
  id: "network.notice-days",
  unit: "calendar days",
  meaning: "Days after the day of installing within which the operator is told of a chargepoint.",
  values: [{ from: registerFrom, value: 28, source: "ena-lct-form", certainty: "seen" }],
});

export const noticeDaysByInstallDay = parameter({
  id: "network.notice-days-ukpn",
  unit: "calendar days",
  meaning: "Days after the day of installing allowed by an operator that wants the notice by that day.",
  values: [{ from: registerFrom, value: 0, source: "ukpn-eds-08-5050 section 10", certainty: "seen" }],
});

export const completionNoticeDays = parameter({
  id: "network.completion-notice-days",
  unit: "calendar days",
  meaning: "Days after installing within which the operator is told that approved work is done.",
  values: [{ from: registerFrom, value: 28, source: "ena-lct-form", certainty: "derived" }],
});

export const generationNoticeDays = parameter({
  id: "network.generation-notice-days",
  unit: "calendar days",
  meaning: "Days, the day of commissioning counted as the first, within which the operator is told of generation.",
  values: [{ from: registerFrom, value: 28, source: "SI 2002/2665 reg 22", certainty: "from memory: verify" }],
});

export const dwellingLimitA = parameter({
  id: "network.dwelling-limit",
  unit: "A a phase",
  meaning: "Demand of a dwelling above which the operator is asked before installing.",
  values: [{ from: registerFrom, value: 60, source: "ena-lct-form section B", certainty: "seen" }],
});

export const nieBandA = parameter({
  id: "network.nie-band-top",
  unit: "A a phase",
  meaning: "Top of the band in which NIE Networks takes the application on the same form.",
  values: [{ from: registerFrom, value: 80, source: "nie-lct", certainty: "seen" }],
});

export const labelDoubtA = parameter({
  id: "network.label-doubt",
  unit: "A",
  meaning: "Rating to which an operator refits cut-outs, so that a label of a higher one is no evidence by itself.",
  values: [{ from: registerFrom, value: 80, source: "nged-fusing", certainty: "seen" }],
});

export const commercialShare = parameter({
  id: "network.commercial-ev-share",
  unit: "of site demand",
  meaning: "Share of the site's demand below which chargepoints within the authorised capacity are only notified.",
  values: [{ from: registerFrom, value: 0.3, source: "scottish-fleet-guide page 5", certainty: "seen" }],
});

export const kvaPerAmpere = parameter({
  id: "network.kva-per-ampere",
  unit: "kVA a phase for one ampere",
  meaning: "Apparent power of one ampere on one phase at the nominal voltage.",
  values: [{ from: registerFrom, value: 0.23, source: "ena-lct-form section B", certainty: "derived" }],
});

export type SupplyTableRow = {
  supply: string;
  cutOutA: number;
  phases: 1 | 3;
  /** Chargepoint current a phase, all chargepoints together, that needs no assessment. */
  freeA: number;
  /** Demand of the whole supply above which the service is upgraded, kVA. */
  upgradeAboveKva: number;
};

export const ukpnTable = parameter<readonly SupplyTableRow[]>({
  id: "network.ukpn-table",
  unit: "A a phase and kVA",
  meaning:
    "Chargepoint current a phase that needs no assessment, by existing supply; the kilowatts printed are read as 3.6 kW = 16 A and 7 kW = 32 A a phase.",
  values: [
    {
      from: registerFrom,
      value: [
        { supply: "80 A single-phase", cutOutA: 80, phases: 1, freeA: 16, upgradeAboveKva: 18 },
        { supply: "80 A three-phase", cutOutA: 80, phases: 3, freeA: 32, upgradeAboveKva: 55 },
        { supply: "100 A single-phase", cutOutA: 100, phases: 1, freeA: 32, upgradeAboveKva: 23 },
        { supply: "100 A three-phase", cutOutA: 100, phases: 3, freeA: 32, upgradeAboveKva: 69 },
      ],
      source: "ukpn-eds-08-5050 table 5-1",
      certainty: "seen",
    },
  ],
});

export const lostEarthOhm = parameter({
  id: "network.lost-earth",
  unit: "Ω",
  meaning:
    "External loop impedance from which the earth of a TN supply is taken as lost. Used to stop a job, never to pass one.",
  values: [{ from: registerFrom, value: 5, source: "our-practice", certainty: "from memory: verify" }],
});

/** Bounds of the fast generation paths, A a phase: design and registered capacity of each unit, and their sum. */
export type GenerationPath = {
  path: "g98" | "sgi-1" | "sgi-2" | "sgi-3";
  unitDesignA: number;
  unitRegisteredA: number;
  sumA: number;
  /** Whether a sum equal to `sumA` still qualifies. */
  sumIncluded: boolean;
  /** Export limit the path needs, A; null when it needs none. */
  exportLimitA: number | null;
  /** Sum registered up to which no export limit is needed, A. */
  limitWaivedUpToA: number | null;
};

export const generationPaths = parameter<readonly GenerationPath[]>({
  id: "network.generation-paths",
  unit: "A a phase",
  meaning:
    "Bounds of the paths for small type-tested generation. Where text and table of the recommendation differ on a bound, the stricter one is taken.",
  values: [
    {
      from: registerFrom,
      value: [
        {
          path: "g98",
          unitDesignA: 16,
          unitRegisteredA: 16,
          sumA: 16,
          sumIncluded: true,
          exportLimitA: null,
          limitWaivedUpToA: null,
        },
        {
          path: "sgi-1",
          unitDesignA: 32,
          unitRegisteredA: 16,
          sumA: 16,
          sumIncluded: true,
          exportLimitA: null,
          limitWaivedUpToA: null,
        },
        {
          path: "sgi-2",
          unitDesignA: 32,
          unitRegisteredA: 16,
          sumA: 32,
          sumIncluded: false,
          exportLimitA: 16,
          limitWaivedUpToA: null,
        },
        {
          path: "sgi-3",
          unitDesignA: 32,
          unitRegisteredA: 32,
          sumA: 60,
          sumIncluded: false,
          exportLimitA: 32,
          limitWaivedUpToA: 32,
        },
      ],
      source: "EREC G99 section 6.2.2",
      certainty: "seen",
    },
  ],
});

export const combinedFormKw = parameter({
  id: "network.combined-form-generation",
  unit: "kW on a single-phase and on a three-phase supply",
  meaning: "Generation and storage of the whole premises up to which it may stand on the combined form.",
  values: [
    {
      from: registerFrom,
      value: { singlePhase: 17, splitPhase: 34, threePhase: 50 },
      source: "ena-v2g-guidance",
      certainty: "seen",
    },
  ],
});

export const phaseImbalanceA = parameter({
  id: "network.generation-imbalance",
  unit: "A",
  meaning: "Difference of generation between the highest and the lowest phase.",
  values: [{ from: registerFrom, value: 32, source: "EREC G99 section 7.5", certainty: "seen" }],
});
