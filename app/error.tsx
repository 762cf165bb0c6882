"use client";

import { Button, ButtonLink } from "@/components/ui/button";

/** Shown when a page could not be made. The digest is the number under which the server logged why. */
export default function PageError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <main id="main" className="plain-page">
      <h1>This page could not be made</h1>
      <p>
        Nothing you saved is lost. Try again; if it happens twice, tell whoever runs Sealwire
        {error.digest ? (
          <>
            {" "}
            and quote <span className="mono">{error.digest}</span>
          </>
        ) : null}
        .
      </p>
      <div className="form__acts">
        <Button kind="act" onClick={reset}>
          Try again
        </Button>
        <ButtonLink href="/">Back to today</ButtonLink>
      </div>
    </main>
  );
}
