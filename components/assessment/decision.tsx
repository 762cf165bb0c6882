import { OutcomeGlyph } from "@/components/ui/mark";
import type { Assessment } from "@/lib/notify/assessment";
import { headline } from "@/lib/notify/headline";
import { reasonRows } from "./check-rows";
import { ReasonTable } from "./reason-table";

/** The route as one sentence, what it means, where it comes from, and the reasons. */
export function Decision({ assessment, children }: { assessment: Assessment; children?: React.ReactNode }) {
  const { title, also, basis } = headline(assessment);
  const isStop = assessment.route.demand === "stop";
  return (
    <section className={isStop ? "decision decision--stop" : "decision"} aria-labelledby="decision">
      <h2 id="decision">
        {isStop && <OutcomeGlyph outcome="not-met" size={36} />}
        {title}
        {isStop && !title.endsWith(".") && "."}
      </h2>
      <p className="decision__also">{also}</p>
      <p className="decision__basis">{basis}</p>
      {children ?? <ReasonTable rows={reasonRows(assessment)} />}
    </section>
  );
}
