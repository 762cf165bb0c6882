import type { Metadata } from "next";
import Link from "next/link";
import { ForgottenForm } from "@/components/account/forgotten-form";
import { TagPage } from "@/components/account/tag-page";
import { requestResetAct } from "../actions";

export const metadata: Metadata = { title: "Forgotten password" };

export default function ForgottenPage() {
  return (
    <TagPage title="Forgotten password">
      <ForgottenForm act={requestResetAct} />
      <div className="tag__also">
        <Link href="/sign-in">Back to sign in</Link>
      </div>
    </TagPage>
  );
}
