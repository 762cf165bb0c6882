import type { Metadata } from "next";
import Link from "next/link";
import { redirect } from "next/navigation";
import { SignInForm } from "@/components/account/sign-in-form";
import { TagPage } from "@/components/account/tag-page";
import { currentSession } from "@/lib/server/auth/viewer";
import { signInAct } from "../actions";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: PageProps<"/sign-in">) {
  if (await currentSession()) redirect("/");
  const { changed } = await searchParams;
  return (
    <TagPage title="Sign in">
      {changed === "1" && <p role="status">Your password is changed. Sign in with the new one.</p>}
      <SignInForm act={signInAct} />
      <div className="tag__also">
        <Link href="/forgotten">Forgotten password</Link>
        <p>New here? Your firm’s admin sends you an invitation by e-mail.</p>
      </div>
    </TagPage>
  );
}
