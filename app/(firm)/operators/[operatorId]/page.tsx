import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { PageHead } from "@/components/frame/page-head";
import { kindWord } from "@/components/operator/operator-words";
import { OwnOperatorForm } from "@/components/operator/own-operator-form";
import { RegisterFacts } from "@/components/operator/register-facts";
import { SettingsForm } from "@/components/operator/settings-form";
import { counted } from "@/components/ui/counted";
import { longDate } from "@/components/ui/dates";
import { withQuery } from "@/components/ui/query-link";
import { Section } from "@/components/ui/section";
import { today } from "@/db/clock";
import { operatorEntry } from "@/lib/notify/operator-register";
import { may } from "@/lib/notify/permissions";
import { requireViewer } from "@/lib/server/auth/viewer";
import { changeOperatorAct, removeOperatorAct, saveSettingsAct } from "../actions";
import { operatorRows } from "../rows";

export async function generateMetadata({ params }: PageProps<"/operators/[operatorId]">): Promise<Metadata> {
  const { operatorId } = await params;
  return { title: operatorEntry(operatorId)?.name ?? "Operator" };
}

export default async function OperatorPage({ params }: PageProps<"/operators/[operatorId]">) {
  const viewer = await requireViewer();
  const { operatorId } = await params;
  const row = (await operatorRows(viewer)).find(({ id }) => id === operatorId);
  if (!row) notFound();
  const manages = may(viewer.roles, "operators.manage");
  return (
    <main id="main" className="deskmain">
      <PageHead title={row.name} say={`${kindWord[row.kind]}, ${row.area}.`} />
      <div className="sheet page-body page-body--two">
        <Section title="What this firm has set" id="settings">
          <SettingsForm row={row} today={today()} act={saveSettingsAct} readOnly={!manages} />
        </Section>
        <Section title={row.own ? "Not in the register" : "In the register"} id="register">
          {row.own && (
            <OwnOperatorForm own={row.own} act={changeOperatorAct} remove={removeOperatorAct} readOnly={!manages} />
          )}
          <dl className="facts">
            <div>
              <dt>Distributor id</dt>
              <dd className="mono">{row.id === "ni" ? "none, Northern Ireland" : row.id}</dd>
            </div>
            {row.own ? (
              <div>
                <dt>Set on</dt>
                <dd>{longDate(row.own.setOn)}</dd>
              </div>
            ) : (
              <RegisterFacts row={row} />
            )}
            <div>
              <dt>Jobs</dt>
              <dd>
                <Link href={withQuery("/jobs", { operator: row.id })}>{counted(row.openJobs, "job")} not closed</Link>
              </dd>
            </div>
            <div>
              <dt>Papers</dt>
              <dd>
                <Link href={withQuery("/submissions", { operator: row.id })}>
                  {counted(row.openPapers, "paper needs someone", "papers need someone")}
                </Link>
              </dd>
            </div>
          </dl>
        </Section>
      </div>
    </main>
  );
}
