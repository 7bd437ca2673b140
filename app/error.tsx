"use client";

import { Button } from "@/components/ui/button";

/** For what nobody expected: what is safe, and what to do. The server's log has the rest. */
export default function ErrorPage({ reset }: { error: Error; reset: () => void }) {
  return (
    <main id="main" className="mx-auto grid max-w-xl justify-items-start gap-4 px-4 py-12">
      <h1 className="text-[2rem] leading-tight">Something went wrong on our side</h1>
      <p>Nothing that was saved is lost. Try again; if it stays like this, tell whoever keeps this installation.</p>
      <Button kind="main" onClick={reset}>
        Try again
      </Button>
    </main>
  );
}
