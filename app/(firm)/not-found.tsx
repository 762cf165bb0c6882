import { ButtonLink } from "@/components/ui/button";

/** Inside the firm's frame, so that the contents list stays at hand. */
export default function NotFoundInFirm() {
  return (
    <main id="main" className="plain-page">
      <h1>Nothing here</h1>
      <p>The page may have moved, or the record belongs to another firm. Nothing of yours was changed.</p>
      <ButtonLink href="/">Back to today</ButtonLink>
    </main>
  );
}
