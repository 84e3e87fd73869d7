'use client';

import { Button } from '@/components/ui/button';

/** What a person sees when a page could not be made: what happened, and what is safe. */
export default function PageError({ reset }: { error: Error; reset: () => void }) {
  return (
    <main
      id="main"
      className="mx-auto flex min-h-dvh max-w-md flex-col items-start justify-center gap-3 px-4"
    >
      <h1 className="text-2xl">This page could not be shown</h1>
      <p className="text-ink-2">
        What you saved before is safe. Try again; if it stays, tell the owner of the workspace.
      </p>
      <Button tone="primary" onClick={reset}>
        Try again
      </Button>
    </main>
  );
}
