import { shortMoment } from "@/components/ui/dates";
import type { SubmissionEntry } from "@/lib/notify/views";

/** What was sent and said, in order, and the step that falls next. */
export function History({
  entries,
  nextStep,
  due,
}: {
  entries: SubmissionEntry[];
  nextStep: string;
  due: string | null;
}) {
  return (
    <section aria-label="History">
      <h2>History</h2>
      <ol className="history">
        {entries.map(({ id, at, text, by, reference }) => (
          <li key={id}>
            <time dateTime={at}>{shortMoment(at)}</time>
            <span>
              {text}
              {reference && !text.includes(reference) && (
                <>
                  {" "}
                  Reference <span className="mono">{reference}</span>.
                </>
              )}{" "}
              {by}.
            </span>
          </li>
        ))}
        <li>
          <span className="quiet">{due ?? "Next"}</span>
          <span className="due">{nextStep}</span>
        </li>
      </ol>
    </section>
  );
}
