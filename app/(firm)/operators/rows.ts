import { today } from "@/db/clock";
import { listOperators } from "@/db/queries/operators";
import { ownFigureNames } from "@/lib/notify/firm-rules";
import { registerFigure } from "@/lib/notify/register-figures";
import type { OperatorRow } from "@/lib/notify/views";
import type { Viewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";

/** What the register says today of each figure that a firm may set. */
const registerOf = (id: string) =>
  Object.fromEntries(
    ownFigureNames.map((name) => [name, registerFigure(name, id, today())]),
  ) as OperatorRow["register"];

/** The register and the firm's own entries with what the firm has set, one flat row an operator, for the table and the page of one. */
export async function operatorRows(viewer: Viewer): Promise<OperatorRow[]> {
  const listed = valueOf(await listOperators(viewer));
  return listed.map(({ entry, own, mailboxes, settings, openPapers, openJobs }) => ({
    id: entry.id,
    name: entry.name,
    area: entry.area,
    group: entry.group,
    kind: entry.kind,
    division: entry.division,
    from: entry.from,
    source: entry.source,
    noticeMailbox: mailboxes?.notice ?? null,
    applicationMailbox: mailboxes?.application ?? null,
    register: registerOf(entry.id),
    own,
    settings,
    openPapers,
    openJobs,
  }));
}
