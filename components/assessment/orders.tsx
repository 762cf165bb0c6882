import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";
import { spacedSupplyNumber } from "@/components/job/answer-text";
import { Stitch } from "@/components/ui/stitch";
import type { Job } from "@/lib/notify/job";

type Props = { job: Job; jobId: string; operatorName: string; danger: string; mayWrite: boolean };

/** What to do when danger is recorded, in order. Nothing is said to be done that nobody has recorded. */
export function Orders({ job, jobId, operatorName, danger, mayWrite }: Props) {
  const isGreatBritain = job.site.territory !== "northern-ireland" && job.site.territory !== null;
  const line = isGreatBritain ? "105" : "the emergency number on the bill";
  const place = [...(job.site.address ?? []), job.site.postcode].filter(Boolean).join(", ");
  const orders: { title: string; words: ReactNode }[] = [
    {
      title: "Make safe: load off, touch nothing",
      words:
        "Charging stopped, new circuit off at its own consumer unit. Covers and seals as found, people kept back. Smoke, sparks or burning: everyone out, call 999.",
    },
    {
      title: "Do not energise",
      words: "Off and labelled until the operator has attended and a competent person clears it.",
    },
    {
      title: `Call ${line} and say: ${danger}`,
      words: (
        <>
          Give {job.site.supplyNumber ? "supply number " : "the address"}
          {job.site.supplyNumber && <span className="mono strong">{spacedSupplyNumber(job.site.supplyNumber)}</span>}
          {place ? `${job.site.supplyNumber ? ", " : ": "}${place}` : ""}. Write down who answered and their reference.
        </>
      ),
    },
    {
      title: "Tell the customer before leaving",
      words: `Nobody touches the cut-out or turns the chargepoint on. Leave ${line} with them.`,
    },
    {
      title: "Send the safety report",
      words: (
        <>
          To {operatorName}, with the photographs. Record the call and their reference when it is sent.
          {mayWrite && (
            <span className="orders__send">
              <Link className="btn btn--act" href={`/jobs/${jobId}/check` as Route}>
                Check and seal the report
              </Link>
            </span>
          )}
        </>
      ),
    },
  ];
  return (
    <ol className="orders">
      {orders.map(({ title, words }, index) => (
        <li key={title}>
          <svg className="stretch" aria-hidden="true">
            <line
              className="ahead"
              x1="24"
              y1={index === 0 ? 24 : 0}
              x2="24"
              y2={index === orders.length - 1 ? "24" : "100%"}
            />
          </svg>
          <Stitch state="not-yet" />
          <div>
            <h3>{title}</h3>
            <p>{words}</p>
          </div>
          <span className="orders__by">
            {index + 1} of {orders.length}
          </span>
        </li>
      ))}
    </ol>
  );
}
