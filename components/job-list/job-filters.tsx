import { Select } from "@/components/ui/field";
import { Filters } from "@/components/ui/filters";
import { OperatorSelect } from "@/components/submission/desk-filters";
import type { JobFilter } from "@/lib/notify/views";
import { routeWord, stageWord, standingWord } from "./route-words";

/** Find jobs by words, stage, standing, operator or route. */
export function JobFilters({ filter, count }: { filter: JobFilter; count: string }) {
  return (
    <Filters
      path="/jobs"
      label="Filter jobs"
      keep={{ sort: filter.sort === "last-day" ? null : filter.sort, installer: filter.installerId }}
      count={count}
    >
      <div className="field filters__find">
        <input
          type="search"
          name="q"
          aria-label="Find"
          placeholder="Job, street, postcode, supply number"
          defaultValue={filter.q ?? ""}
        />
      </div>
      <WordSelect name="stage" label="Stage" any="Any stage" words={stageWord} value={filter.stage} />
      <WordSelect name="standing" label="Standing" any="Any standing" words={standingWord} value={filter.standing} />
      <WordSelect name="route" label="Route" any="Any route" words={routeWord} value={filter.route} />
      <OperatorSelect value={filter.operatorId} />
    </Filters>
  );
}

type WordSelectProps = {
  name: string;
  label: string;
  any: string;
  words: Record<string, string>;
  value: string | null;
};

const WordSelect = ({ name, label, any, words, value }: WordSelectProps) => (
  <Select name={name} aria-label={label} defaultValue={value ?? ""}>
    <option value="">{any}</option>
    {Object.entries(words).map(([word, said]) => (
      <option key={word} value={word}>
        {said}
      </option>
    ))}
  </Select>
);
