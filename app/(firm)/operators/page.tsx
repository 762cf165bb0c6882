import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { OperatorTable } from "@/components/operator/operator-table";
import { ButtonLink } from "@/components/ui/button";
import { withQuery } from "@/components/ui/query-link";
import { today } from "@/db/clock";
import { may } from "@/lib/notify/permissions";
import { requireViewer } from "@/lib/server/auth/viewer";
import { operatorRows } from "./rows";

export const metadata: Metadata = { title: "Operators" };

export default async function OperatorsPage() {
  const viewer = await requireViewer();
  const rows = await operatorRows(viewer);
  const set = rows.filter(({ settings }) => settings.noticeEmail).length;
  const own = rows.filter((row) => row.own).length;
  const entered = own ? ` ${own} entered by this firm.` : "";
  return (
    <main id="main" className="deskmain">
      <PageHead
        title="Operators"
        say={`${rows.length - own} in the register, by the first two digits of a supply number.${entered} ${set} with an address of yours.`}
      >
        {may(viewer.roles, "operators.manage") && (
          <ButtonLink href={withQuery("/operators/new")}>Enter one that is missing</ButtonLink>
        )}
      </PageHead>
      <div className="sheet">
        <OperatorTable rows={rows} today={today()} />
      </div>
    </main>
  );
}
