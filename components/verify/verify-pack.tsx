"use client";

import { useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { counted } from "@/components/ui/counted";
import { longMoment } from "@/components/ui/dates";
import { OutcomeGlyph } from "@/components/ui/mark";
import { LargeSeal } from "@/components/ui/seal";
import { checkPack, type PackCheck } from "./check-pack";
import { FileSums } from "./file-sums";

type Standing =
  | { at: "start" }
  | { at: "reading"; name: string }
  | { at: "refused"; name: string; message: string }
  | { at: "checked"; name: string; bytes: number; check: PackCheck };

const mostBytes = 500_000_000;

/** A place to drop a pack, and what comes of hashing it again. No file leaves this device. */
export function VerifyPack() {
  const [standing, setStanding] = useState<Standing>({ at: "start" });
  const input = useRef<HTMLInputElement>(null);
  const read = async (file: File | undefined) => {
    if (!file) return;
    setStanding({ at: "reading", name: file.name });
    if (file.size > mostBytes) {
      setStanding({ at: "refused", name: file.name, message: "This file is too large to be a pack." });
      return;
    }
    const result = await checkPack(new Uint8Array(await file.arrayBuffer()));
    setStanding(
      result.ok
        ? { at: "checked", name: file.name, bytes: file.size, check: result.value }
        : { at: "refused", name: file.name, message: result.message },
    );
  };
  return (
    <>
      <div
        className="drop verify__drop"
        onDragOver={(event) => event.preventDefault()}
        onDrop={(event) => {
          event.preventDefault();
          void read(event.dataTransfer.files[0]);
        }}
      >
        <span role="status">{inWords(standing)}</span>
        <input
          ref={input}
          className="vh"
          type="file"
          accept=".zip,application/zip"
          aria-label="Pack to check"
          tabIndex={-1}
          onChange={(event) => void read(event.currentTarget.files?.[0])}
        />
        <Button kind="act" onClick={() => input.current?.click()}>
          Choose a pack
        </Button>
      </div>
      {standing.at === "refused" && (
        <p className="verify__refused" role="alert">
          {standing.message}
        </p>
      )}
      {standing.at === "checked" && <Checked check={standing.check} />}
    </>
  );
}

function inWords(standing: Standing) {
  if (standing.at === "start") return "Drop a pack here: the zip as it was sent to you.";
  if (standing.at === "reading") return `Reading ${standing.name}`;
  if (standing.at === "refused") return standing.name;
  const megabytes = (standing.bytes / 1_000_000).toFixed(1);
  return `${standing.name}, ${megabytes} MB, ${counted(standing.check.files.length, "file")} and the manifest`;
}

function Checked({ check: { manifest, files, fingerprint } }: { check: PackCheck }) {
  const wrong = files.filter(({ standing }) => standing !== "matches");
  const intact = wrong.length === 0;
  return (
    <div className="verify">
      <section aria-labelledby="result">
        <div className="verify__say">
          <h2 id="result" className={intact ? "is-intact" : "is-broken"}>
            <OutcomeGlyph outcome={intact ? "met" : "not-met"} size={32} />
            <span>
              {intact
                ? `Intact. All ${files.length} files match the manifest.`
                : `Not intact. ${counted(wrong.length, "file differs", "files differ")}.`}
            </span>
          </h2>
          <p className="decision__basis">
            {intact
              ? "Each file was hashed again and laid beside the manifest in the pack."
              : `Do not rely on this copy. Ask ${manifest.firm ?? "the firm"} for version ${manifest.version} again.`}
          </p>
        </div>
        <FileSums files={files} />
      </section>
      <aside className="sealed" aria-label="Seal">
        <LargeSeal hash8={fingerprint.slice(0, 8)} parted={!intact} />
        <h2>{intact ? `Version ${manifest.version}` : "The seal does not hold"}</h2>
        <dl>
          <dt>Job</dt>
          <dd className="mono">{manifest.jobNumber}</dd>
          <dt>Firm</dt>
          <dd>{manifest.firm ?? "not recorded"}</dd>
          <dt>When</dt>
          <dd>{longMoment(manifest.issuedAt)}</dd>
          <dt>By</dt>
          <dd>{manifest.sealedBy}</dd>
          <dt>Rules</dt>
          <dd className="mono">{manifest.ruleset}</dd>
        </dl>
        <p className="hash" aria-label={`SHA-256 of this file: ${fingerprint}`}>
          {fingerprint.match(/.{8}/g)?.map((part, index) => (
            <span key={index} aria-hidden="true">
              {index === 0 ? <b>{part}</b> : part}
            </span>
          ))}
        </p>
        <p className="chart-cap">
          Compare the first eight characters with those the firm gave you: a manifest can be rewritten with the files. A
          match shows these are the files that were sealed. It does not judge what they say.
        </p>
      </aside>
    </div>
  );
}
