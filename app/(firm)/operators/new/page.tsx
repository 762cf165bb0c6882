import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { PageHead } from "@/components/frame/page-head";
import { OwnOperatorForm } from "@/components/operator/own-operator-form";
import { Section } from "@/components/ui/section";
import { may } from "@/lib/notify/permissions";
import { requireViewer } from "@/lib/server/auth/viewer";
import { addOperatorAct } from "../actions";

export const metadata: Metadata = { title: "Enter an operator" };

export default async function NewOperatorPage() {
  const viewer = await requireViewer();
  if (!may(viewer.roles, "operators.manage")) notFound();
  return (
    <main id="main" className="deskmain">
      <PageHead
        title="Enter an operator"
        say="For a distributor id that the register lacks. Papers name it as the firm’s own entry, with the source given here."
      />
      <div className="sheet page-body page-body--two">
        <Section title="The firm’s own entry" id="entry">
          <OwnOperatorForm own={null} act={addOperatorAct} />
        </Section>
        <Section title="What it changes" id="changes">
          <p>
            A supply number that begins with these digits names this operator in place of “not known”. The general rules
            and 28 days hold until the firm sets figures of its own for it. Should the register take the id up, the
            register’s name stands.
          </p>
        </Section>
      </div>
    </main>
  );
}
