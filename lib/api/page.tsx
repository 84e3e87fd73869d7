import 'server-only';
import { dehydrate, HydrationBoundary, QueryClient } from '@tanstack/react-query';
import { headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import type { ReactNode } from 'react';
import type { Answer, Contract, Request } from '@/lib/contracts/contract';
import { queryKeyOf } from '@/lib/contracts/query-key';
import { findPerson } from '@/lib/services/sign-in';
import { perform, type Caller } from '@/lib/use-cases/perform';
import { Refusal } from '@/lib/use-cases/refusal';
import type { UseCase } from '@/lib/use-cases/world';

/** Who asks for the page that is being rendered. */
export async function pageCaller(): Promise<Caller> {
  return { person: await findPerson(await headers()) };
}

/**
 * Runs a use case for a page. A visitor is sent to sign in and comes back; what may not be seen looks like what
 * does not exist.
 */
async function loadForPage<C extends Contract>(
  useCase: UseCase<C>,
  input: Request<C>,
  from: string,
): Promise<Answer<C>> {
  try {
    return await perform(useCase, await pageCaller(), input as { params?: unknown; query?: unknown });
  } catch (error) {
    if (error instanceof Refusal && error.code === 'signed_out')
      redirect(`/sign-in?next=${encodeURIComponent(from)}`);
    if (error instanceof Refusal && (error.code === 'not_found' || error.code === 'not_allowed')) notFound();
    throw error;
  }
}

type Prefetched = { key: readonly unknown[]; load: (from: string) => Promise<unknown> };

/** One query that a page fills before it is sent. */
export function prefetched<C extends Contract>(useCase: UseCase<C>, input: Request<C>): Prefetched {
  return { key: queryKeyOf(useCase.contract, input), load: (from) => loadForPage(useCase, input, from) };
}

/** Renders its children with the queries already answered, by the same use cases that the routes call. */
export async function Prefetch({
  queries,
  from,
  children,
}: {
  queries: Prefetched[];
  from: string;
  children: ReactNode;
}) {
  const client = new QueryClient();
  // One after the other: each takes a connection, and a page needs few.
  for (const { key, load } of queries) client.setQueryData(key, await load(from));
  return <HydrationBoundary state={dehydrate(client)}>{children}</HydrationBoundary>;
}
