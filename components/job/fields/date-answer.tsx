import { Input } from "@/components/ui/field";
import type { Question } from "../questions/model";
import type { AnswerProps } from "./answer";

/** A day, with today one tap away. `today` is the London day the page was drawn on. */
export function DateAnswer({
  id,
  question,
  value,
  held,
  describedBy,
  edit,
  today,
}: AnswerProps<Extract<Question, { kind: "date" }>> & { today: string }) {
  const shown = String(held?.typed ?? value ?? "");
  return (
    <div className="with-unknown">
      <Input
        id={id}
        type="date"
        value={shown}
        wrong={held !== null}
        aria-describedby={describedBy}
        onChange={(event) => edit(event.target.value || null)}
      />
      <button type="button" className="choice" aria-pressed={value === today} onClick={() => edit(today)}>
        Today<span className="vh">: {question.label}</span>
      </button>
    </div>
  );
}
