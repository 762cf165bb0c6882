import { OutcomeGlyph } from "@/components/ui/mark";
import type { FileCheck } from "./check-pack";

const standingWord: Record<FileCheck["standing"], string> = {
  matches: "matches",
  altered: "altered",
  missing: "not in this pack",
  added: "not sealed",
};

const isPhoto = (name: string) => name.startsWith("photos/");
const isPart = (name: string) => name.includes("/") && !isPhoto(name);

/** Every file beside its seal; one that differs opens in place with sealed above found. */
export function FileSums({ files }: { files: FileCheck[] }) {
  const groups = [
    { name: "Documents", files: files.filter(({ name }) => !name.includes("/")) },
    { name: "Drawings and data", files: files.filter(({ name }) => isPart(name)) },
    { name: "Photos", files: files.filter(({ name }) => isPhoto(name)) },
  ];
  return (
    <div className="sums">
      {groups
        .filter((group) => group.files.length > 0)
        .map((group) => (
          <section key={group.name} aria-label={group.name}>
            <h3>
              {group.name}
              <span>
                {group.files.filter(({ standing }) => standing === "matches").length} of {group.files.length} match
              </span>
            </h3>
            <ul>
              {group.files.map((file) => (
                <FileLine key={file.name} file={file} />
              ))}
            </ul>
          </section>
        ))}
    </div>
  );
}

function FileLine({ file }: { file: FileCheck }) {
  const matches = file.standing === "matches";
  return (
    <li className={matches ? undefined : "is-altered"}>
      <OutcomeGlyph outcome={matches ? "met" : "not-met"} size={14} />
      <span title={file.name}>
        {file.name}
        <span className="vh">, {standingWord[file.standing]}</span>
      </span>
      <span className="mono">{matches ? file.sealed?.sha256.slice(0, 8) : standingWord[file.standing]}</span>
      {!matches && (
        <div className="differs">
          <Sum word="sealed" sum={file.sealed} />
          <Sum word="found" sum={file.found} differs />
        </div>
      )}
    </li>
  );
}

function Sum({ word, sum, differs }: { word: string; sum: FileCheck["sealed"]; differs?: boolean }) {
  const text = sum ? `${sum.sha256.slice(0, 8)} ${sum.sha256.slice(8, 16)} …` : "nothing";
  return (
    <>
      <span>{word}</span>
      {differs ? <b className="mono">{text}</b> : <span className="mono">{text}</span>}
      <span>{sum ? `${sum.bytes.toLocaleString("en-GB")} bytes` : ""}</span>
    </>
  );
}
