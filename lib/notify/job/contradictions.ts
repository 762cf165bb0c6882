import type { Job } from "../job";
import type { FieldError } from "../result";

/** Facts that cannot all be true. Each names the field to change and how. */
export function contradictions(job: Job): FieldError[] {
  return [...dateContradictions(job), ...idContradictions(job), ...chargepointContradictions(job)];
}

function dateContradictions({ stage, dates }: Job): FieldError[] {
  const errors: FieldError[] = [];
  if (stage === "installed" && !dates.installed)
    errors.push({
      path: "dates.installed",
      message: "the job is recorded as installed: give the day it was installed",
    });
  if (dates.installed && dates.commissioned && dates.commissioned < dates.installed)
    errors.push({ path: "dates.commissioned", message: "is before the day of installing; check both dates" });
  return errors;
}

function idContradictions(job: Job): FieldError[] {
  const errors: FieldError[] = [];
  for (const list of ["boards", "circuits", "chargepoints"] as const) {
    const seen = new Set<string>();
    job[list].forEach(({ id }, index) => {
      if (seen.has(id))
        errors.push({ path: `${list}[${index}].id`, message: `"${id}" stands twice; give each its own` });
      seen.add(id);
    });
  }
  const boards = new Set(job.boards.map(({ id }) => id));
  const circuits = new Set(job.circuits.map(({ id }) => id));
  job.circuits.forEach((circuit, index) => {
    if (circuit.board && !boards.has(circuit.board))
      errors.push({ path: `circuits[${index}].board`, message: `no board is called "${circuit.board}"` });
    if (circuit.fedFrom && (!circuits.has(circuit.fedFrom) || circuit.fedFrom === circuit.id))
      errors.push({ path: `circuits[${index}].fedFrom`, message: `no other circuit is called "${circuit.fedFrom}"` });
  });
  for (const [index, circuit] of job.circuits.entries())
    if (feedsItself(circuit.id, job))
      errors.push({
        path: `circuits[${index}].fedFrom`,
        message: "leads back to this circuit; name the circuit nearer the supply",
      });
  job.chargepoints.forEach((unit, index) => {
    if (unit.circuit && !circuits.has(unit.circuit))
      errors.push({ path: `chargepoints[${index}].circuit`, message: `no circuit is called "${unit.circuit}"` });
  });
  return errors;
}

function feedsItself(id: string, { circuits }: Job): boolean {
  const before = new Map(circuits.map((circuit) => [circuit.id, circuit.fedFrom]));
  const passed = new Set<string>();
  for (let next = before.get(id); next && next !== id && !passed.has(next); next = before.get(next)) passed.add(next);
  const last = [...passed].at(-1) ?? id;
  return before.get(last) === id && last !== id;
}

function chargepointContradictions({ chargepoints, supply }: Job): FieldError[] {
  return chargepoints.flatMap((unit, index) => {
    const errors: FieldError[] = [];
    if (unit.phases !== null && supply.phases !== null && unit.phases > supply.phases)
      errors.push({
        path: `chargepoints[${index}].phases`,
        message: `a unit of ${unit.phases} phases cannot stand on a supply of ${supply.phases}; check supply.phases and this unit`,
      });
    const { soldByFirm, transfer } = unit.smartCharging;
    if (soldByFirm === true && transfer === "none")
      errors.push({
        path: `chargepoints[${index}].smartCharging.transfer`,
        message: 'is "none" although the firm sold the unit; choose sale, hire, loan or gift',
      });
    return errors;
  });
}
