import type { ReactNode } from "react";
import { longDate } from "@/components/ui/dates";
import type { Job } from "@/lib/notify/job";
import { siteOf, spacedSupplyNumber, unitOf } from "./answer-text";

/** The head of a job on a desk: where it is, its number, unit, day and supply number, and its acts at the right. */
export function JobHead({ number, record, children }: { number: string; record: Job; children?: ReactNode }) {
  const { dates, stage, site } = record;
  const day = stage === "installed" ? dates.installed : dates.planned;
  const power = record.chargepoints[0]?.smartCharging.maximumPowerKw;
  return (
    <header className="job-head">
      <div>
        <h1>{siteOf(record)}</h1>
        <p className="job-head__facts">
          <span className="mono">{number}</span>
          <span>
            {unitOf(record)}
            {typeof power === "number" && (
              <>
                , <b>{power} kW</b>
              </>
            )}
          </span>
          {day && (
            <span>
              {stage === "installed" ? "Installed" : "Planned"} <b>{longDate(day)}</b>
            </span>
          )}
          {site.supplyNumber && (
            <span>
              Supply <b className="mono">{spacedSupplyNumber(site.supplyNumber)}</b>
            </span>
          )}
        </p>
      </div>
      {children && <div className="job-head__acts">{children}</div>}
    </header>
  );
}
