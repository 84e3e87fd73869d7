import { createParser, parseAsString, parseAsStringLiteral } from 'nuqs/server';
import { animalStatus, sex } from '@/lib/contracts/animal';
import { animalSort, type AnimalSort } from '@/lib/contracts/animal-list';

/** At most so many rows are fetched at once; more than any one room holds. */
export const LIST_LIMIT = 1000;

const parseAsSort = createParser<AnimalSort>({
  parse: (text) => animalSort.safeParse(text).data ?? null,
  serialize: String,
});

/** Filters of the list as they stand in the address. */
export const listParams = {
  q: parseAsString.withDefault(''),
  species: parseAsString.withDefault(''),
  sex: parseAsStringLiteral(['', ...sex.options] as const).withDefault(''),
  status: parseAsStringLiteral(['present', 'all', ...animalStatus.options] as const).withDefault('present'),
  project: parseAsString.withDefault(''),
  holder: parseAsString.withDefault(''),
  locus: parseAsString.withDefault(''),
  at: parseAsStringLiteral(['shows', 'carries', 'possible', 'free'] as const).withDefault('carries'),
  sort: parseAsSort.withDefault('code'),
};

export interface ListState {
  q: string;
  species: string;
  sex: '' | (typeof sex.options)[number];
  status: 'present' | 'all' | (typeof animalStatus.options)[number];
  project: string;
  holder: string;
  locus: string;
  at: 'shows' | 'carries' | 'possible' | 'free';
  sort: AnimalSort;
}

const identifier = /^[0-9a-f]{8}-[0-9a-f-]{27}$/i;
const idOrNothing = (text: string) => (identifier.test(text) ? text : undefined);

/** What is asked of the server for a state of the address; the page and the browser ask the same. */
export function listQueryOf(state: ListState) {
  const locus = idOrNothing(state.locus);
  return {
    search: state.q.slice(0, 80) || undefined,
    species: idOrNothing(state.species),
    sex: state.sex || undefined,
    status: state.status === 'all' ? undefined : state.status,
    project: idOrNothing(state.project),
    holder: idOrNothing(state.holder),
    locus,
    at: locus ? state.at : undefined,
    sort: state.sort,
    limit: LIST_LIMIT,
  };
}

/** Whether anything narrows the list beyond what it starts with. */
export function isFiltered(state: ListState): boolean {
  return Boolean(
    state.q ||
    state.species ||
    state.sex ||
    state.project ||
    state.holder ||
    state.locus ||
    state.status !== 'present',
  );
}
