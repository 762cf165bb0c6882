import { answerText } from "@/components/job/answer-text";
import { labelOf, placeOf } from "@/components/job/questions/screens";
import { counted } from "@/components/ui/counted";
import { longMoment, shortMoment } from "@/components/ui/dates";
import { LargeSeal } from "@/components/ui/seal";
import type { Job } from "@/lib/notify/job";
import type { PackView } from "@/lib/notify/views";

type Props = {
  packs: readonly PackView[];
  sealed: PackView | null;
  record: Job;
  missing: number;
  /** The record has not changed since the newest version. */
  isCurrent: boolean;
};

/** The seal of the newest version with its hash, and every version with what changed. */
export function SealAside({ packs, sealed, record, missing, isCurrent }: Props) {
  return (
    <aside className="sealed" aria-label="Seal">
      {sealed?.sha256 ? (
        <Sealed pack={sealed} sha256={sealed.sha256} isCurrent={isCurrent} />
      ) : (
        <NotSealed missing={missing} isBuilding={packs[0]?.status === "building"} />
      )}
      {packs.length > 0 && (
        <div className="versions">
          <div className="section section__head">
            <h3>Versions</h3>
          </div>
          <ol reversed>
            {packs.map((pack) => (
              <li key={pack.id} className={pack === packs[0] ? undefined : "quiet"}>
                <span className="mono strong">{pack.version}</span>
                <span>
                  <b className="strong">{shortMoment(pack.issuedAt)}</b>
                  <br />
                  {statusInWords(pack)} {pack.gapsReason && <> With gaps: {pack.gapsReason}</>}
                  <Changes changes={pack.changes} record={record} />
                  {pack.status === "sealed" && (
                    <a href={`/api/v1/packs/${pack.id}/download`} download>
                      Download<span className="vh"> version {pack.version}</span>
                    </a>
                  )}
                </span>
              </li>
            ))}
          </ol>
        </div>
      )}
    </aside>
  );
}

function Sealed({ pack, sha256, isCurrent }: { pack: PackView; sha256: string; isCurrent: boolean }) {
  const groups = sha256.match(/.{1,8}/g) ?? [];
  return (
    <>
      <LargeSeal hash8={sha256.slice(0, 8)} />
      <h2>Sealed, version {pack.version}</h2>
      {!isCurrent && <p>Facts have changed since. The preview is of the next version.</p>}
      <dl>
        <dt>When</dt>
        <dd>{longMoment(pack.issuedAt)}</dd>
        <dt>By</dt>
        <dd>{pack.sealedBy}</dd>
        <dt>Rules</dt>
        <dd className="mono">{pack.ruleset}</dd>
      </dl>
      <p className="hash" aria-label={`SHA-256 of the pack, ${sha256}`} role="img">
        {groups.map((group, index) => (
          <span key={index}>{index === 0 ? <b>{group}</b> : group}</span>
        ))}
      </p>
    </>
  );
}

function NotSealed({ missing, isBuilding }: { missing: number; isBuilding: boolean }) {
  if (isBuilding)
    return (
      <>
        <h2>Being sealed</h2>
        <p className="quiet">The seal hangs here when every file is built.</p>
      </>
    );
  return (
    <>
      <h2>Not sealed</h2>
      <p className="quiet">
        {missing
          ? `${counted(missing, "fact")} missing. It can be sealed with gaps when a reason is given.`
          : "Nothing is missing for this route."}
      </p>
    </>
  );
}

function statusInWords({ status, sealedBy, sha256, version }: PackView): string {
  if (status === "building") return `Version ${version} is being built.`;
  if (status === "failed") return "Could not be built.";
  return `Sealed by ${sealedBy}. Kept as ${sha256?.slice(0, 8) ?? "no hash"}.`;
}

const mostShown = 6;

/** What was another value in the version before, fact by fact. */
function Changes({ changes, record }: { changes: PackView["changes"]; record: Job }) {
  if (changes.length === 0) return null;
  const shown = changes.slice(0, mostShown);
  return (
    <ul className="changes">
      {shown.map(({ path, was, now }) => {
        const question = placeOf(path, record)?.screen?.questions.find(({ at }) => at === path);
        const words = (value: unknown) =>
          question ? answerText(question, value) : value === null ? "Not recorded" : "recorded";
        return (
          <li key={path}>
            {labelOf(path, record)}: {words(was)}, now {words(now)}
          </li>
        );
      })}
      {changes.length > mostShown && <li>and {counted(changes.length - mostShown, "other fact")}</li>}
    </ul>
  );
}
