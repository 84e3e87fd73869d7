import Link from 'next/link';

export default function NotFound() {
  return (
    <main id="main" className="mx-auto flex min-h-dvh max-w-md flex-col justify-center gap-3 px-4">
      <h1 className="text-2xl">Not found</h1>
      <p className="text-ink-2">There is nothing at this address, or you may not see it.</p>
      <Link href="/" className="text-slate underline">
        Back to the start
      </Link>
    </main>
  );
}
