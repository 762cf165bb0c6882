import type { Metadata } from "next";
import Link from "next/link";
import { NewPasswordForm } from "@/components/account/new-password-form";
import { TagPage } from "@/components/account/tag-page";
import { roleName } from "@/lib/notify/roles";
import { lookUpInvitation } from "@/lib/server/auth/sign-in";
import { acceptInvitationAct } from "../../actions";

export const metadata: Metadata = { title: "Invitation", referrer: "no-referrer", robots: "noindex" };

export default async function InvitationPage({ params }: PageProps<"/invitation/[token]">) {
  const { token } = await params;
  const found = await lookUpInvitation(token);
  if (!found.ok)
    return (
      <TagPage title="Invitation">
        <p>{found.error.message}</p>
        <div className="tag__also">
          <Link href="/sign-in">Sign in</Link>
        </div>
      </TagPage>
    );
  const { firmName, email, roles, hasAccount } = found.value;
  return (
    <TagPage title={`Join ${firmName}`}>
      <p>
        As {roles.map((role) => roleName[role].toLowerCase()).join(", ")}, signing in as <b>{email}</b>.
        {hasAccount && " This address has an account already: enter its password."}
      </p>
      <NewPasswordForm
        act={acceptInvitationAct}
        token={token}
        known={hasAccount}
        withName={!hasAccount}
        button="Join"
      />
    </TagPage>
  );
}
