import { ruleset } from "@/lib/notify/rule-day";
import { rulesList } from "@/lib/notify/rules-list";

/** Prints every rule with what it reads, what it may answer and its sources; `--json` for a program. */
function lines(): string[] {
  const blocks = rulesList.map(({ id, title, reads, outcomes, sources }) => [
    `${id}  ${title}`,
    `  reads     ${reads.join(", ") || "nothing"}`,
    `  answers   ${outcomes.join(", ")}`,
    `  sources   ${sources.join("; ")}`,
  ]);
  return [`Rule set ${ruleset}, ${rulesList.length} rules`, ...blocks.flatMap((block) => ["", ...block])];
}

const asJson = process.argv.includes("--json");
process.stdout.write(
  asJson ? `${JSON.stringify({ ruleset, rules: rulesList }, null, 2)}\n` : `${lines().join("\n")}\n`,
);
