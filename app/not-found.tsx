import type { Metadata } from "next";
import { ButtonLink } from "@/components/ui/button";

export const metadata: Metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <main id="main" className="plain-page">
      <h1>Nothing here</h1>
      <p>The page may have moved, or the record belongs to another firm. Nothing of yours was changed.</p>
      <ButtonLink href="/">Back to today</ButtonLink>
    </main>
  );
}
