import { longMoment } from "@/components/ui/dates";
import { Mark } from "@/components/ui/mark";

/** Work that failed at its last try: nobody tries it again unless a person sees to it. */
export function PutDown({ works }: { works: readonly { id: string; what: string; at: string }[] }) {
  return (
    <section className="put-down" aria-labelledby="put-down">
      <h2 id="put-down">Given up after the last try</h2>
      <ul>
        {works.map(({ id, what, at }) => (
          <li key={id}>
            <Mark outcome="not-met">Failed</Mark>
            <span>{what}</span>
            <time dateTime={at}>{longMoment(at)}</time>
          </li>
        ))}
      </ul>
    </section>
  );
}
