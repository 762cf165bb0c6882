import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { RuleTable } from "@/components/rules/rule-table";
import { groupName } from "@/components/rules/rule-words";
import { today } from "@/db/clock";
import { ruleset } from "@/lib/notify/assess";
import type { Group } from "@/lib/notify/result";
import { rulesList } from "@/lib/notify/rules-list";
import { requireViewer } from "@/lib/server/auth/viewer";

export const metadata: Metadata = { title: "Rules" };

export default async function RulesPage() {
  await requireViewer();
  const on = today();
  const groups = (Object.keys(groupName) as Group[]).map((group) => ({
    group,
    rules: rulesList.filter((rule) => rule.group === group),
  }));
  return (
    <main id="main" className="deskmain">
      <PageHead
        title="Rules"
        say={`${rulesList.length} rules, set ${ruleset}. A missing fact is never a pass: it answers “cannot tell”.`}
      />
      <div className="sheet page-body rules">
        <nav aria-label="Families">
          <ul className="rules__families">
            {groups.map(({ group, rules }) => (
              <li key={group}>
                <a href={`#family-${group}`}>
                  {groupName[group]} <b>{rules.length}</b>
                </a>
              </li>
            ))}
          </ul>
        </nav>
        {groups.map(({ group, rules }) => (
          <RuleTable key={group} id={group} name={groupName[group]} rules={rules} on={on} />
        ))}
      </div>
    </main>
  );
}
