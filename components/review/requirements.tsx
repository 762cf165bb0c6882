import { longDate } from "@/components/ui/dates";
import { Mark } from "@/components/ui/mark";
import type { SmartChargingResult } from "@/lib/notify/assessment";
import type { Outcome } from "@/lib/notify/result";
import type { PhotoView } from "@/lib/notify/views";
import { evidenceOf } from "./evidence";

const order: Outcome[] = ["not-met", "cannot-tell", "met", "not-applicable"];

/** Each requirement with what was recorded, the evidence beside it and its grade. What needs a person stands first. */
export function Requirements({ results, photos }: { results: readonly SmartChargingResult[]; photos: PhotoView[] }) {
  const sorted = [...results].sort((a, b) => order.indexOf(a.outcome) - order.indexOf(b.outcome));
  return (
    <table className="ledger ledger--review section">
      <caption className="vh">Smart-charging requirements</caption>
      <thead>
        <tr>
          <th>Outcome</th>
          <th>Requirement</th>
          <th>Recorded</th>
          <th>
            <span className="ev__heads">
              <span>Evidence</span>
              <span>Grade</span>
            </span>
          </th>
        </tr>
      </thead>
      <tbody>
        {sorted.map((result) => (
          <Requirement key={`${result.rule} ${result.chargepoint}`} result={result} photos={photos} />
        ))}
      </tbody>
    </table>
  );
}

function Requirement({ result, photos }: { result: SmartChargingResult; photos: PhotoView[] }) {
  const open = result.outcome === "not-met" || result.outcome === "cannot-tell";
  return (
    <tr className={result.outcome === "not-met" ? "is-open" : undefined}>
      <td>
        <Mark outcome={result.outcome} />
      </td>
      <td className="req">
        <div>
          <span className="mono">{result.rule}</span>
          {open ? (
            <div>
              {result.title}
              <p className="more">{result.because}</p>
            </div>
          ) : (
            <details>
              <summary>{result.title}</summary>
              <p className="more">{result.because}</p>
            </details>
          )}
        </div>
      </td>
      <td>{result.recorded ?? (result.outcome === "cannot-tell" && <span className="quiet">not recorded</span>)}</td>
      <td>
        <EvidenceCell result={result} photos={photos} large={result.outcome === "not-met"} />
      </td>
    </tr>
  );
}

function EvidenceCell({ result, photos, large }: { result: SmartChargingResult; photos: PhotoView[]; large: boolean }) {
  const { photo, number, grade, words } = evidenceOf(result, photos);
  return (
    <div className={large && photo ? "ev ev--large" : "ev"}>
      {photo ? (
        <>
          <a href={photo.url} target="_blank" rel="noreferrer">
            {/* eslint-disable-next-line @next/next/no-img-element -- a private file behind a session, already small */}
            <img src={photo.url} alt={`${words}, photo ${number}`} loading="lazy" />
          </a>
          <span>
            {words}
            <small>
              photo {number}
              {photo.takenAt && `, ${longDate(photo.takenAt)}`}
            </small>
          </span>
        </>
      ) : (
        <span className="ev__text">{words}</span>
      )}
      <span className="grade">
        {grade ?? (
          <>
            <span aria-hidden="true">–</span>
            <span className="vh">no grade</span>
          </>
        )}
      </span>
    </div>
  );
}
