import { Select } from "@/components/ui/field";
import { Filters } from "@/components/ui/filters";
import { operatorRegister } from "@/lib/notify/operator-register";
import { submissionPurposeName, submissionPurposes } from "@/lib/notify/submission";
import type { SubmissionFilter } from "@/lib/notify/views";

/** Find by words, by operator, by paper. */
export function DeskFilters({ filter, count }: { filter: SubmissionFilter; count: string }) {
  return (
    <Filters path="/submissions" label="Filter submissions" keep={{ tab: filter.tab }} count={count}>
      <div className="field filters__find">
        <input
          type="search"
          name="q"
          aria-label="Find"
          placeholder="Job, street, postcode, reference"
          defaultValue={filter.q ?? ""}
        />
      </div>
      <OperatorSelect value={filter.operatorId} />
      <Select name="purpose" aria-label="Paper" defaultValue={filter.purpose ?? ""}>
        <option value="">Any paper</option>
        {submissionPurposes.map((purpose) => (
          <option key={purpose} value={purpose}>
            {submissionPurposeName[purpose]}
          </option>
        ))}
      </Select>
    </Filters>
  );
}

/** Every operator of the register, with its area where one name covers several. */
export const OperatorSelect = ({ value }: { value: string | null }) => (
  <Select name="operator" aria-label="Operator" defaultValue={value ?? ""}>
    <option value="">Any operator</option>
    {operatorRegister.map(({ id, name, area, kind }) => (
      <option key={id} value={id}>
        {kind === "dno" ? `${name}, ${area}` : name}
      </option>
    ))}
  </Select>
);
