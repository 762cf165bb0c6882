import type { Held } from "@/components/drafts/draft-state";

/** What every kind of answer is given. */
export type AnswerProps<Q> = {
  id: string;
  question: Q;
  value: unknown;
  held: Held | null;
  describedBy: string | undefined;
  edit: (value: unknown) => void;
  hold: (typed: unknown, message: string) => void;
};

/** A number as a person types it; null when blank, undefined when it is none. */
export function numberTyped(text: string): number | null | undefined {
  const bare = text.replace(/\s/g, "");
  if (bare === "") return null;
  return /^-?(\d+\.?\d*|\.\d+)$/.test(bare) ? Number(bare) : undefined;
}
