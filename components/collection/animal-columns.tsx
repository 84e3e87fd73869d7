import Image from 'next/image';
import { ShareStrip, type Share } from '@/components/drawings/share-strip';
import { Badge } from '@/components/ui/badge';
import type { DataColumn } from '@/components/ui/data-column';
import type { AnimalRow } from '@/lib/contracts/animal-list';
import { AnimalCode } from './animal-code';
import { originWords, sayAge, sayGrams, sayHatched, statusTones, statusWords } from './words';

/** Columns of the list of animals. */
export function animalColumns({
  shares,
  photo,
  today,
  manySpecies,
  seesTubs,
}: {
  shares: (parts: AnimalRow['owners']) => Share[];
  photo: (row: AnimalRow) => string | null;
  today: string;
  manySpecies: boolean;
  seesTubs: boolean;
}): DataColumn<AnimalRow>[] {
  const columns: (DataColumn<AnimalRow> | null)[] = [
    {
      id: 'code',
      header: 'Animal',
      width: 'minmax(9.5rem, 11rem)',
      sortable: true,
      hideable: false,
      onCard: 'title',
      cell: (row) => (
        <span className="flex items-center gap-2.5">
          <Thumbnail src={photo(row)} />
          <span className="flex min-w-0 flex-col items-start">
            <AnimalCode code={row.code} sex={row.sex} size="sm" />
            {row.name ? <span className="truncate text-sm text-ink-3">{row.name}</span> : null}
          </span>
        </span>
      ),
    },
    {
      id: 'looks',
      header: 'Looks and carries',
      width: 'minmax(12rem, 2.4fr)',
      sortable: true,
      cell: (row) => <span className="line-clamp-2">{row.description}</span>,
    },
    manySpecies
      ? {
          id: 'species',
          header: 'Species',
          sortable: true,
          width: 'minmax(7rem, 1fr)',
          startsHidden: true,
          cell: (row) => row.species.name,
        }
      : null,
    {
      id: 'hatched',
      header: 'Hatched',
      width: '7.5rem',
      sortable: true,
      cell: (row) => (
        <>
          <span>
            {row.hatchedOn ? (
              sayHatched(row.hatchedOn, row.hatchedPrecision)
            ) : (
              <span className="text-ink-3">not known</span>
            )}
          </span>
          <span className="text-sm text-ink-3">{sayAge(row.hatchedOn, today)}</span>
        </>
      ),
    },
    {
      id: 'weight',
      header: 'Weight',
      width: '6rem',
      align: 'end',
      sortable: true,
      cell: (row) => (row.grams === null ? <span className="text-ink-3">–</span> : sayGrams(row.grams)),
    },
    seesTubs
      ? {
          id: 'place',
          header: 'Place',
          width: '5.5rem',
          sortable: true,
          cell: (row) => (
            <span className="font-mono">{row.tub?.label ?? <span className="text-ink-3">–</span>}</span>
          ),
        }
      : null,
    {
      id: 'status',
      header: 'Status',
      width: '8rem',
      sortable: true,
      cell: (row) => (
        <span>
          <Badge tone={statusTones[row.status]}>{statusWords[row.status]}</Badge>
        </span>
      ),
    },
    {
      id: 'owners',
      header: 'Owned by',
      width: 'minmax(7rem, 1fr)',
      cell: (row) => (
        <ShareStrip shares={shares(row.owners)} label="Owned by" size="sm" className="w-full max-sm:w-32" />
      ),
    },
    {
      id: 'projects',
      header: 'Projects',
      width: 'minmax(8rem, 1fr)',
      startsHidden: true,
      cell: (row) =>
        row.projects.map(({ name }) => name).join(', ') || <span className="text-ink-3">none</span>,
    },
    {
      id: 'origin',
      header: 'Origin',
      width: '8rem',
      startsHidden: true,
      cell: (row) => originWords[row.origin],
    },
  ];
  return columns.filter((column) => column !== null);
}

function Thumbnail({ src }: { src: string | null }) {
  return (
    <span className="size-8 shrink-0 overflow-hidden rounded-md bg-track max-sm:size-10">
      {/* The route checks who asks, so the picture comes straight from it and not through the image optimiser. */}
      {src ? (
        <Image unoptimized src={src} alt="" width={64} height={64} className="size-full object-cover" />
      ) : null}
    </span>
  );
}
