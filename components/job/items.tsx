"use client";

import { Button } from "@/components/ui/button";
import type { Job } from "@/lib/notify/job";
import type { Repeats, Subject } from "./questions/model";

/** Empty items as the record's own reader makes them, so that nothing in a new one is undefined. */
export type Blanks = { [L in Repeats]: Job[L][number] };

const noun: Record<Repeats, string> = { chargepoints: "chargepoint", circuits: "circuit", boards: "board" };
const idStem: Record<Repeats, string> = { chargepoints: "cp", circuits: "c", boards: "b" };
const listsOf: Partial<Record<Subject, readonly Repeats[]>> = {
  chargepoint: ["chargepoints"],
  circuit: ["circuits", "boards"],
};

function freeId(list: Repeats, job: Job): string {
  const taken = new Set(job[list].map(({ id }) => id));
  for (let number = job[list].length + 1; ; number += 1) {
    const id = `${idStem[list]}${number}`;
    if (!taken.has(id)) return id;
  }
}

type Props = {
  subject: Subject;
  /** The item on the screen. */
  item: { list: Repeats; index: number; of: number } | null;
  job: Job;
  blanks: Blanks;
  edit: (path: string, value: unknown) => void;
  /** Called with the list and place of what was added. */
  onAdded: (list: Repeats, index: number) => void;
};

/** Adds a chargepoint, circuit or board, or takes out the one on the screen. */
export function Items({ subject, item, job, blanks, edit, onAdded }: Props) {
  const lists = listsOf[subject] ?? [];
  if (lists.length === 0) return null;
  const add = (list: Repeats) => {
    const index = job[list].length;
    const feed = list === "chargepoints" ? { circuit: job.circuits[index]?.id ?? null } : {};
    edit(`${list}[${index}]`, { ...blanks[list], id: freeId(list, job), ...feed });
    onAdded(list, index);
  };
  const remove = ({ list, index }: NonNullable<typeof item>) => {
    const id = job[list][index]?.id;
    edit(
      list,
      job[list].filter((_, at) => at !== index),
    );
    for (const [path, named] of namingPaths(list, job)) if (named === id) edit(path, null);
  };
  return (
    <div className="items">
      {lists.map((list) => (
        <Button key={list} onClick={() => add(list)}>
          Add {job[list].length ? "another" : "a"} {noun[list]}
        </Button>
      ))}
      {item && lists.includes(item.list) && (
        <Button kind="plain" onClick={() => remove(item)}>
          Remove this {noun[item.list]}
          {item.of > 1 ? ` (${item.index + 1} of ${item.of})` : ""}
        </Button>
      )}
    </div>
  );
}

/** Facts that name an item of a list: cleared when the item is taken out. */
function namingPaths(list: Repeats, job: Job): [string, string | null][] {
  if (list === "circuits")
    return [
      ...job.chargepoints.map(({ circuit }, index): [string, string | null] => [
        `chargepoints[${index}].circuit`,
        circuit,
      ]),
      ...job.circuits.map(({ fedFrom }, index): [string, string | null] => [`circuits[${index}].fedFrom`, fedFrom]),
    ];
  if (list === "boards")
    return job.circuits.map(({ board }, index): [string, string | null] => [`circuits[${index}].board`, board]);
  return [];
}
