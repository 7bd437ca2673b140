"use client";

import { NarrowSheet, PublicFrame } from "@/components/accounts/public-frame";
import { Button, LinkButton } from "@/components/ui/button";
import { Value } from "@/components/ui/tag";

/** For what nobody expected: what is safe, and what to do. The server's log has the rest, under the mark shown here. */
export default function ErrorPage({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <PublicFrame>
      <NarrowSheet title="Something went wrong on our side" next="Nothing that was saved is lost.">
        <p>Try again. If it stays like this, tell whoever keeps this installation.</p>
        {error.digest && (
          <p className="text-ink2">
            Mark in the log: <Value className="text-ink">{error.digest}</Value>
          </p>
        )}
        <div className="flex flex-wrap gap-3">
          <Button kind="main" onClick={reset}>
            Try again
          </Button>
          <LinkButton href="/">Back to the beginning</LinkButton>
        </div>
      </NarrowSheet>
    </PublicFrame>
  );
}
