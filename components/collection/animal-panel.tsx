'use client';

import { GitFork, Pencil } from 'lucide-react';
import Link from 'next/link';
import { ShareStrip } from '@/components/drawings/share-strip';
import { Badge } from '@/components/ui/badge';
import { buttonClasses } from '@/components/ui/button';
import { ErrorState } from '@/components/ui/error-state';
import { KeyValueList } from '@/components/ui/key-value-list';
import { Skeleton } from '@/components/ui/skeleton';
import { useAnimal } from '@/lib/client/collection';
import { useMay, useWorkspace } from '@/lib/client/workspace';
import type { AnimalRecord } from '@/lib/contracts/animal-record';
import type { AnimalId } from '@/lib/contracts/ids';
import { AnimalCode } from './animal-code';
import { CarriesSection } from './carries-section';
import { DocumentsSection } from './documents-section';
import { OwnersSection } from './owners-section';
import { PhotosSection } from './photos-section';
import { RelativesSection } from './relatives-section';
import { useShares } from './shares-of';
import { WeightsSection } from './weights-section';
import { originWords, sayAge, sayHatched, sexWords, statusTones, statusWords } from './words';
import { sayDay } from '@/components/drawings/season-days';

/** The code and name of the chosen animal, as the head of the panel. */
export function AnimalPanelTitle({ id }: { id: AnimalId }) {
  const animal = useAnimal(id).data;
  if (!animal) return 'Animal';
  return (
    <span className="flex flex-wrap items-center gap-2">
      <AnimalCode code={animal.code} sex={animal.sex} size="lg" />
      {animal.name}
    </span>
  );
}

export function AnimalPanelFooter({ id }: { id: AnimalId }) {
  const { slug } = useWorkspace();
  const mayEdit = useMay('animal.edit');
  return (
    <>
      <Link href={`/${slug}/collection/lineage?animal=${id}`} className={buttonClasses()}>
        <GitFork aria-hidden /> Lineage
      </Link>
      {mayEdit ? (
        <Link href={`/${slug}/collection/${id}/edit`} className={buttonClasses()}>
          <Pencil aria-hidden /> Edit
        </Link>
      ) : null}
    </>
  );
}

/** The record of the chosen animal. */
export function AnimalPanel({ id, onClose }: { id: AnimalId; onClose: () => void }) {
  const query = useAnimal(id);
  if (query.isPending) return <PanelSkeleton />;
  if (query.isError) {
    const isGone = query.error.problem?.status === 404;
    return (
      <ErrorState
        title={isGone ? 'No such animal' : undefined}
        onRetry={isGone ? onClose : () => void query.refetch()}
        retrying={query.isFetching}
      >
        {query.error.problem?.detail}
      </ErrorState>
    );
  }
  return <AnimalDetails animal={query.data} />;
}

function AnimalDetails({ animal }: { animal: AnimalRecord }) {
  const { today, slug } = useWorkspace();
  const shares = useShares(animal.parties);
  const inForce = animal.ownership.find((set) => set.untilDay === null);
  const age = animal.status === 'died' ? '' : sayAge(animal.hatchedOn, today);
  return (
    <div className="flex flex-col gap-6">
      <header className="flex flex-col gap-2">
        <p className="text-base text-ink-2">
          <strong className="font-semibold text-ink">{animal.description}</strong>
          <br />
          {sexWords[animal.sex]} · {animal.species.name}
          {animal.tub ? (
            <>
              {' '}
              · tub <span className="font-mono">{animal.tub.label}</span>
            </>
          ) : null}
        </p>
        <ShareStrip shares={shares(inForce?.parts ?? [])} size="md" labels="parts" label="Owned by" />
      </header>
      <PhotosSection animal={animal} />
      <CarriesSection animal={animal} />
      <RelativesSection animal={animal} />
      <section>
        <h3 className="mb-1 text-lg">Record</h3>
        <KeyValueList
          ruled
          items={[
            {
              key: 'Status',
              value: (
                <span className="inline-flex items-center gap-2">
                  <Badge tone={statusTones[animal.status]}>{statusWords[animal.status]}</Badge>
                  {animal.statusSince ? (
                    <span className="text-sm text-ink-3">since {sayDay(animal.statusSince)}</span>
                  ) : null}
                </span>
              ),
            },
            {
              key: 'Hatched',
              value: `${sayHatched(animal.hatchedOn, animal.hatchedPrecision)}${age ? ` · ${age}` : ''}`,
            },
            ...(animal.sexedBy ? [{ key: 'Sex known by', value: animal.sexedBy }] : []),
            { key: 'Origin', value: originWords[animal.origin] },
            ...(animal.tub
              ? [{ key: 'Place', value: `${animal.tub.label} · ${animal.tub.rack}, ${animal.tub.room}` }]
              : []),
            ...(animal.heldBack ? [{ key: 'Held back', value: 'yes, not for sale' }] : []),
            {
              key: 'Projects',
              value: animal.projects.length
                ? animal.projects.map((project, index) => (
                    <span key={project.id}>
                      {index > 0 ? ', ' : ''}
                      <Link
                        className="text-slate underline underline-offset-2"
                        href={`/${slug}/season/projects/${project.id}`}
                      >
                        {project.name}
                      </Link>
                    </span>
                  ))
                : 'none',
            },
          ]}
        />
        {animal.notes ? (
          <p className="mt-2 text-base whitespace-pre-wrap text-ink-2">{animal.notes}</p>
        ) : null}
      </section>
      <WeightsSection animal={animal} />
      <OwnersSection animal={animal} />
      <DocumentsSection animal={animal} />
    </div>
  );
}

function PanelSkeleton() {
  return (
    <div role="status" aria-label="Loading" className="flex flex-col gap-4">
      <Skeleton className="h-5 w-3/4" />
      <Skeleton className="h-3 w-full" />
      <Skeleton className="h-40 w-full" />
      {Array.from({ length: 5 }, (_, index) => (
        <Skeleton key={index} className="h-5 w-full" />
      ))}
    </div>
  );
}
