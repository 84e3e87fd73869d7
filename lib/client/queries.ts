'use client';

import { queryOptions, useMutation, useQueryClient, type QueryKey } from '@tanstack/react-query';
import { useRef } from 'react';
import type { Answer, Contract, Request } from '@/lib/contracts/contract';
import { queryKeyOf } from '@/lib/contracts/query-key';
import { request, type RequestError } from './request';

/** Query options of a reading contract; pages fill the same key. */
export function optionsOf<C extends Contract>(contract: C, input: Request<C>) {
  return queryOptions<Answer<C>, RequestError>({
    queryKey: queryKeyOf(contract, input),
    queryFn: ({ signal }) => request(contract, input, { signal }),
  });
}

/**
 * Mutation of a writing contract. Contracts that take an idempotency key get one per intention: it stays the same
 * while an attempt is repeated after a failure to reach the server, and is new after an answer.
 * @param refreshes names of the contracts whose answers may have changed
 */
export function useContractMutation<C extends Contract>(contract: C, refreshes: readonly Contract[] = []) {
  const client = useQueryClient();
  const key = useRef<string | null>(null);
  return useMutation<Answer<C>, RequestError, Request<C>>({
    mutationFn: async (input) => {
      if (!contract.idempotent) return request(contract, input);
      key.current ??= crypto.randomUUID();
      try {
        const answer = await request(contract, input, { idempotencyKey: key.current });
        key.current = null;
        return answer;
      } catch (error) {
        if ((error as RequestError).problem?.status) key.current = null;
        throw error;
      }
    },
    onSuccess: async () => {
      const ids = new Set(refreshes.map((refreshed) => refreshed.id));
      await client.invalidateQueries({
        predicate: ({ queryKey }: { queryKey: QueryKey }) => ids.has(String(queryKey[0])),
      });
    },
  });
}
