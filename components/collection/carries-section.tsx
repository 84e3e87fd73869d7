'use client';

import { useState } from 'react';
import { AllelePair } from '@/components/drawings/allele-pair';
import { Button } from '@/components/ui/button';
import type { AnimalRecord, LocusOfAnimal } from '@/lib/contracts/animal-record';

/** A locus is worth a line when there is a copy, or may be one, or somebody recorded something. */
const isOfInterest = (locus: LocusOfAnimal) =>
  locus.claim !== null || locus.copies.some(({ probability }) => probability > 0);

/** What an animal carries: one pair of alleles per locus, and in words where that comes from. */
export function CarriesSection({ animal }: { animal: AnimalRecord }) {
  const [showsAll, setShowsAll] = useState(false);
  const interesting = animal.loci.filter(isOfInterest);
  const rest = animal.loci.length - interesting.length;
  const shown = showsAll ? animal.loci : interesting;
  return (
    <section>
      <h3 className="mb-2 text-lg">What it carries</h3>
      {shown.length === 0 ? (
        <p className="text-base text-ink-2">
          Nothing is known of any copy. It counts as normal at every locus.
        </p>
      ) : null}
      <ul className="flex flex-col gap-2">
        {shown.map((locus) => (
          <li
            key={locus.locusId}
            className="grid grid-cols-[minmax(0,1fr)_auto_minmax(0,1fr)] items-center gap-3"
          >
            <span className="font-semibold break-words">{locus.name}</span>
            <AllelePair locus={locus.name} copies={locus.copies} note={locus.words} className="!w-18" />
            <span className="text-sm text-ink-3">
              {locus.words}
              {locus.source === 'relatives' ? ', by its relatives' : ''}
            </span>
          </li>
        ))}
      </ul>
      {rest > 0 ? (
        <Button
          size="sm"
          tone="link"
          className="mt-2"
          aria-expanded={showsAll}
          onClick={() => setShowsAll(!showsAll)}
        >
          {showsAll ? 'Only loci with a copy' : `${rest} more without a copy`}
        </Button>
      ) : null}
    </section>
  );
}
