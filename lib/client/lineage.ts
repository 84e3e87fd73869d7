'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { showLineage } from '@/lib/contracts/lineage';
import { optionsOf } from './queries';
import { useWorkspaceSlug } from './workspace';

/** The lineage of an animal or a species; the graph before stays in sight while the next is fetched. */
export function useLineage(query: z.input<typeof showLineage.query>) {
  const workspace = useWorkspaceSlug();
  const asks = Boolean(query.animal) !== Boolean(query.species);
  return useQuery({
    ...optionsOf(showLineage, { params: { workspace }, query }),
    placeholderData: keepPreviousData,
    enabled: asks,
  });
}
