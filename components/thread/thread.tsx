import type { Route } from "next";
import Link from "next/link";
import { Eyelet, type Standing, type Surface } from "@/components/ui/eyelet";
import { HangingSeal } from "@/components/ui/seal";
import { Stitch, Stretch, type StitchState } from "@/components/ui/stitch";
import type { Eyelet as EyeletName, ThreadView } from "@/lib/notify/views";

const eyeletWord: Record<EyeletName, string> = {
  job: "Job",
  assessment: "Assessment",
  pack: "Pack",
  submission: "Submission",
  review: "Review",
};

/** Where each eyelet's page is. */
export const eyeletHref = (jobId: string, eyelet: EyeletName) =>
  (eyelet === "job" ? `/jobs/${jobId}` : `/jobs/${jobId}/${eyelet}`) as Route;

type Props = {
  jobId: string;
  thread: ThreadView;
  /** The eyelet whose page is open. */
  current?: EyeletName;
};

/**
 * The thread of one job: five eyelets on a copper wire. On a desk it runs across, coming in from the margin;
 * on a phone it runs down the left edge.
 */
export function Thread({ jobId, thread, current }: Props) {
  return (
    <ol className="thread" aria-label="Where this job stands">
      {thread.map((eyelet, index) => {
        const next = thread[index + 1];
        return (
          <li
            key={eyelet.name}
            className={liClass[eyelet.standing]}
            aria-current={eyelet.name === current ? "step" : undefined}
          >
            {index === 0 && <LeadIn />}
            {next && <Wire passed={eyelet.standing === "passed" && next.standing !== "ahead"} />}
            {eyelet.hash8 && <HangingSeal />}
            <Eyelet standing={eyelet.standing} />
            <Stretch wire={phoneWire(eyelet.standing, !next)} />
            <Stitch state={stitchOf[eyelet.standing]} />
            <Link className="thread__name" href={eyeletHref(jobId, eyelet.name)}>
              {eyeletWord[eyelet.name]}
            </Link>
            <span className="thread__state">{eyelet.state}</span>
            {eyelet.hash8 && <span className="thread__hash">{eyelet.hash8}</span>}
          </li>
        );
      })}
    </ol>
  );
}

const liClass: Record<Standing, string | undefined> = {
  passed: undefined,
  now: undefined,
  ahead: "is-ahead",
  stopped: "is-stopped",
};
const stitchOf: Record<Standing, StitchState> = {
  passed: "answered",
  now: "in-hand",
  ahead: "not-yet",
  stopped: "stopped",
};
const phoneWire = (standing: Standing, last: boolean) =>
  standing === "passed"
    ? last
      ? "end"
      : "whole"
    : standing === "ahead"
      ? last
        ? "ahead-end"
        : "ahead"
      : last
        ? "end"
        : "to-here";

const LeadIn = () => (
  <svg className="thread__lead" viewBox="0 0 48 24" fill="none" aria-hidden="true">
    <path d="M0 15C14 19 34 14 48 12" />
  </svg>
);

const Wire = ({ passed }: { passed: boolean }) => (
  <svg
    className={passed ? "thread__wire" : "thread__wire thread__wire--ahead"}
    viewBox="0 0 100 24"
    preserveAspectRatio="none"
    fill="none"
    aria-hidden="true"
  >
    <path d={passed ? "M0 12Q50 28 100 12" : "M0 12H100"} />
  </svg>
);

/** The same for a list row or a head, 132 x 24, with its words as one label. */
export function ThreadMini({ thread, surface = "sheet" }: { thread: ThreadView; surface?: Surface }) {
  const reached = thread.findLastIndex(({ standing }) => standing !== "ahead");
  return (
    <svg
      className="thread-mini"
      viewBox="0 0 132 24"
      width="132"
      height="24"
      fill="none"
      role="img"
      aria-label={inWords(thread)}
    >
      <path d={sagged(reached)} stroke="var(--color-copper)" strokeWidth="2" />
      {reached < thread.length - 1 && (
        <path
          d={`M${centre(reached) + 10} 10H122`}
          stroke="var(--color-rule-strong)"
          strokeWidth="1.5"
          strokeDasharray="0 5"
          strokeLinecap="round"
        />
      )}
      {thread.map(({ name, standing }, index) => (
        <MiniEyelet key={name} x={centre(index)} standing={standing} surface={surface} />
      ))}
      {thread.map(({ name, hash8 }, index) =>
        hash8 ? (
          <g key={name}>
            <path d={`M${centre(index)} 15V17`} stroke="var(--color-copper)" strokeWidth="1.5" />
            <circle cx={centre(index)} cy="20" r="3.5" fill="var(--color-lead)" />
          </g>
        ) : null,
      )}
    </svg>
  );
}

const centre = (index: number) => 10 + 28 * index;

const sagged = (reached: number) =>
  [
    "M0 10Q5 13 10 10",
    ...Array.from({ length: Math.max(0, reached) }, (_, i) => `Q${centre(i) + 14} 15 ${centre(i + 1)} 10`),
  ].join("");

function MiniEyelet({ x, standing, surface }: { x: number; standing: Standing; surface: Surface }) {
  const ground = `var(--color-${surface})`;
  if (standing === "passed")
    return <circle cx={x} cy="10" r="4.5" fill="var(--color-copper)" stroke="var(--color-ink)" strokeWidth="2" />;
  if (standing === "stopped") return <path d={`M${x - 5} 5H${x + 5}V15H${x - 5}Z`} fill="var(--color-oxide)" />;
  if (standing === "ahead")
    return <circle cx={x} cy="10" r="4" fill={ground} stroke="var(--color-rule-strong)" strokeWidth="1.25" />;
  return (
    <>
      <circle cx={x} cy="10" r="6" fill={ground} stroke="var(--color-ink)" strokeWidth="2.5" />
      <path d={`M${x - 8} 11.3 ${x} 10`} stroke="var(--color-copper)" strokeWidth="2" />
    </>
  );
}

function inWords(thread: ThreadView) {
  const passed = thread.filter(({ standing }) => standing === "passed").map(({ name }) => eyeletWord[name]);
  const now = thread.find(({ standing }) => standing === "now" || standing === "stopped");
  const first = passed.length ? `${passed.join(", ")} passed` : "Nothing passed yet";
  return now ? `${first}; ${eyeletWord[now.name]} ${now.standing}` : first;
}
