import type { Route } from "next";
import Link from "next/link";
import type { PackView } from "@/lib/notify/views";
import type { DocumentModel } from "@/templates/model";
import { bytesInWords } from "./bytes";

type Props = { jobId: string; documents: readonly DocumentModel[]; shown: string; pack: PackView | null };

/** The documents of this job, and, once sealed, the files beside them. */
export function DocumentList({ jobId, documents, shown, pack }: Props) {
  const beside = pack ? besideDocuments(pack.files) : [];
  return (
    <nav aria-label="Documents in this pack">
      <div className="pack__bar">
        <h2>In the pack</h2>
        <span className="quiet">{pack ? `${pack.files.length} files` : `${documents.length} documents`}</span>
      </div>
      <ul className="files">
        {documents.map(({ slug, title }) => (
          <li key={slug}>
            <Link
              href={`/jobs/${jobId}/pack?doc=${slug}` as Route}
              aria-current={slug === shown ? "page" : undefined}
              scroll={false}
            >
              <span className="n">{slug.slice(0, 2)}</span>
              {title}
              <span className="p" />
            </Link>
          </li>
        ))}
      </ul>
      {beside.length > 0 && (
        <ul className="files files--beside">
          <li className="sub">Beside the documents</li>
          {beside.map(({ name, count, bytes }) => (
            <li key={name} className="file-row">
              <span>{name}</span>
              <span className="p">{count > 1 ? `${count}, ${bytesInWords(bytes)}` : bytesInWords(bytes)}</span>
            </li>
          ))}
        </ul>
      )}
    </nav>
  );
}

const folderName: Record<string, string> = {
  drawings: "Drawings",
  photos: "Photos, places removed",
  data: "Record, assessment and rows",
};

/** What is no document, a line a folder. */
function besideDocuments(files: PackView["files"]) {
  const lines = new Map<string, { name: string; count: number; bytes: number }>();
  for (const { name, bytes } of files.filter((file) => !/\.(docx|pdf)$/.test(file.name))) {
    const folder = name.includes("/") ? (name.split("/")[0] ?? name) : name;
    const line = lines.get(folder) ?? { name: folderName[folder] ?? folder, count: 0, bytes: 0 };
    lines.set(folder, { ...line, count: line.count + 1, bytes: line.bytes + bytes });
  }
  return [...lines.values()];
}
