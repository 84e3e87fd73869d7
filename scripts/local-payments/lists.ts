import { invalid, missing } from './api-error';
import type { Parameters } from './parameters';

interface Paging {
  limit: number;
  startingAfter: string | null;
  endingBefore: string | null;
  isInTime: (created: number) => boolean;
}

/** Reads what every list takes; lists without `created` have `hasTime` false. */
export function readPaging(parameters: Parameters, hasTime = true): Paging {
  const limit = parameters.integer('limit') ?? 10;
  if (limit < 1 || limit > 100) throw invalid('Limit must be from 1 to 100', 'limit');
  const startingAfter = parameters.text('starting_after');
  const endingBefore = parameters.text('ending_before');
  if (startingAfter !== null && endingBefore !== null) {
    throw invalid('You may only specify one of starting_after and ending_before.', 'starting_after');
  }
  return { limit, startingAfter, endingBefore, isInTime: hasTime ? readTime(parameters) : () => true };
}

function readTime(parameters: Parameters): (created: number) => boolean {
  if (!parameters.has('created')) return () => true;
  let range: Parameters | null;
  try {
    range = parameters.child('created');
  } catch {
    const exact = parameters.integer('created');
    return (created) => exact === null || created === exact;
  }
  const gte = range?.integer('gte') ?? -Infinity;
  const gt = range?.integer('gt') ?? -Infinity;
  const lte = range?.integer('lte') ?? Infinity;
  const lt = range?.integer('lt') ?? Infinity;
  return (created) => created >= gte && created > gt && created <= lte && created < lt;
}

export interface ListAnswer {
  object: 'list';
  data: unknown[];
  has_more: boolean;
  url: string;
}

/**
 * One page, newest first.
 * @param kept oldest first, as the state keeps them
 */
export function listPage<T extends { id: string; created?: number }>(
  kept: readonly T[],
  paging: Paging,
  url: string,
): ListAnswer {
  const items = kept.filter((item) => paging.isInTime(item.created ?? 0)).reverse();
  const positionOf = (id: string, param: string) => {
    const at = items.findIndex((item) => item.id === id);
    if (at === -1) throw missing('object', id, param);
    return at;
  };
  if (paging.endingBefore !== null) {
    const end = positionOf(paging.endingBefore, 'ending_before');
    const start = Math.max(0, end - paging.limit);
    return { object: 'list', data: items.slice(start, end), has_more: start > 0, url };
  }
  const start = paging.startingAfter === null ? 0 : positionOf(paging.startingAfter, 'starting_after') + 1;
  const end = start + paging.limit;
  return { object: 'list', data: items.slice(start, end), has_more: end < items.length, url };
}
