import * as buildingControl from "./building-control";
import { circuitRules } from "./checks/circuit";
import { demandRules } from "./checks/demand/rules";
import { openPenRules } from "./checks/open-pen";
import { powerQualityRules } from "./checks/power-quality";
import type { Rule as WiringRule } from "./checks/rule";
import { supplyRules } from "./checks/supply";
import * as approval from "./route/approval";
import * as cutOut from "./route/cut-out";
import * as danger from "./route/danger";
import * as decide from "./route/decide";
import * as demand from "./route/demand";
import * as devices from "./route/devices";
import * as firmFigures from "./route/firm-figures";
import * as generation from "./route/generation";
import * as overlays from "./route/overlays";
import * as service from "./route/service";
import * as supplyNumber from "./route/supply-number";
import type { RuleDefinition } from "./rule";
import * as defaultHours from "./smart-charging/default-hours";
import { designRules } from "./smart-charging/design";
import * as randomDelay from "./smart-charging/random-delay";
import * as salePapers from "./smart-charging/sale-papers";
import * as scope from "./smart-charging/scope";
import * as security from "./smart-charging/security";

/** What a module declares among its exports: everything that has an id and outcomes is a rule. */
const declaredIn = (module: Record<string, unknown>): RuleDefinition[] =>
  Object.values(module).filter(
    (value): value is RuleDefinition =>
      typeof value === "object" && value !== null && "id" in value && "outcomes" in value && "reads" in value,
  );

const wiring = (rules: readonly WiringRule[]): RuleDefinition[] =>
  rules.map(({ gives, sources, ...rest }) => ({ ...rest, outcomes: gives, sources: sources as [string, ...string[]] }));

const plain = ({ id, group, title, reads, sources, outcomes }: RuleDefinition): RuleDefinition => ({
  id,
  group,
  title,
  reads,
  sources,
  outcomes,
});

const routeRules = [
  danger,
  decide,
  demand,
  overlays,
  cutOut,
  service,
  devices,
  supplyNumber,
  approval,
  firmFigures,
].flatMap(declaredIn);
const settingsRules = [scope, salePapers, designRules, defaultHours, randomDelay, security].flatMap(declaredIn);

/** Every rule the program applies: what it checks, what it reads, what it may answer, and on whose word. */
export const rulesList: readonly RuleDefinition[] = [
  ...routeRules.filter(({ group }) => group === "route"),
  ...[...declaredIn(generation), ...routeRules.filter(({ group }) => group === "generation")],
  ...wiring([...demandRules, ...supplyRules, ...circuitRules, ...openPenRules, ...powerQualityRules]),
  ...declaredIn(buildingControl),
  ...settingsRules,
].map(plain);
