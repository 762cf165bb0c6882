import type { Metadata } from "next";
import Link from "next/link";
import { NewPasswordForm } from "@/components/account/new-password-form";
import { TagPage } from "@/components/account/tag-page";
import { resetIsOpen } from "@/lib/server/auth/sign-in";
import { resetPasswordAct } from "../../actions";

export const metadata: Metadata = { title: "New password", referrer: "no-referrer", robots: "noindex" };

export default async function ResetPage({ params }: PageProps<"/reset/[token]">) {
  const { token } = await params;
  const open = await resetIsOpen(token);
  return (
    <TagPage title="New password">
      {open ? (
        <NewPasswordForm act={resetPasswordAct} token={token} button="Keep this password" />
      ) : (
        <p>This link has been used or has run out.</p>
      )}
      <div className="tag__also">
        <Link href="/forgotten">Ask for another link</Link>
        {open && <p>Your sessions on every device end when the password changes.</p>}
      </div>
    </TagPage>
  );
}
