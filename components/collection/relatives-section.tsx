'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import { useWorkspace } from '@/lib/client/workspace';
import type { AnimalRecord, Relative } from '@/lib/contracts/animal-record';
import { AnimalCode } from './animal-code';
import { sayDay } from '@/components/drawings/season-days';

/** A relative as a link to its record, or that it is not shown to this person. */
function RelativeLink({ relative }: { relative: Relative }) {
  const { slug } = useWorkspace();
  if (!relative.shown) return <span className="text-ink-3 italic">not shown to you</span>;
  return (
    <Link
      href={`/${slug}/collection/${relative.id}`}
      className="inline-flex min-w-0 flex-wrap items-center gap-x-2 hover:underline"
    >
      <AnimalCode code={relative.code} sex={relative.sex} size="sm" />
      <span className="text-sm text-ink-2">{relative.description}</span>
    </Link>
  );
}

function Line({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="grid grid-cols-[6.5rem_minmax(0,1fr)] items-baseline gap-2 border-b border-rule-2 py-1.5 last:border-b-0">
      <dt className="text-ink-2">{label}</dt>
      <dd className="flex min-w-0 flex-col gap-1">{children}</dd>
    </div>
  );
}

const pairingWords: Record<string, string> = {
  draft: 'draft',
  proposed: 'proposed',
  agreed: 'agreed',
  withdrawn: 'withdrawn',
  ended: 'ended',
};
const FIRST_YOUNG = 6;

/** Parents, young, pairings and clutches of an animal. */
export function RelativesSection({ animal }: { animal: AnimalRecord }) {
  const { slug } = useWorkspace();
  const young = animal.young.slice(0, FIRST_YOUNG);
  const more = animal.young.length - young.length;
  return (
    <section>
      <h3 className="mb-1 text-lg">Family</h3>
      <dl className="text-base">
        <Line label="Sire">
          {animal.sire ? (
            <RelativeLink relative={animal.sire} />
          ) : animal.possibleSires.length ? (
            <>
              <span className="text-sm text-ink-3">one of these</span>
              {animal.possibleSires.map(({ sire, weight }, index) => (
                <span key={sire.shown ? sire.id : index} className="flex items-center gap-2">
                  <RelativeLink relative={sire} />
                  {animal.possibleSires.some((other) => other.weight !== weight) ? (
                    <span className="font-mono text-sm">×{weight}</span>
                  ) : null}
                </span>
              ))}
            </>
          ) : (
            <span className="text-ink-3">not known</span>
          )}
        </Line>
        <Line label="Dam">
          {animal.dam ? (
            <RelativeLink relative={animal.dam} />
          ) : (
            <span className="text-ink-3">not known</span>
          )}
        </Line>
        {animal.hatchedFrom ? (
          <Line label="Clutch">
            <Link
              href={`/${slug}/clutches/${animal.hatchedFrom.id}`}
              className="font-mono text-slate underline underline-offset-2"
            >
              {animal.hatchedFrom.code}
            </Link>
          </Line>
        ) : null}
        {young.length ? (
          <Line label="Young">
            {young.map((one, index) => (
              <RelativeLink key={one.shown ? one.id : index} relative={one} />
            ))}
            {more > 0 ? (
              <Link
                href={`/${slug}/collection/lineage?animal=${animal.id}`}
                className="text-sm text-slate underline underline-offset-2"
              >
                and {more} more, in the lineage
              </Link>
            ) : null}
          </Line>
        ) : null}
        {animal.pairings.length ? (
          <Line label="Pairings">
            {animal.pairings.map((pairing) => (
              <span key={pairing.id} className="flex flex-wrap items-center gap-x-2">
                <Link
                  href={`/${slug}/season/pairings/${pairing.id}`}
                  className="text-slate underline underline-offset-2"
                >
                  {pairing.season}, {pairingWords[pairing.status] ?? pairing.status}
                </Link>
                <span className="text-ink-3">with</span>
                <RelativeLink relative={pairing.mate} />
              </span>
            ))}
          </Line>
        ) : null}
        {animal.clutches.length ? (
          <Line label="Clutches">
            {animal.clutches.map((clutch) => (
              <span key={clutch.id}>
                <Link
                  href={`/${slug}/clutches/${clutch.id}`}
                  className="font-mono text-slate underline underline-offset-2"
                >
                  {clutch.code}
                </Link>{' '}
                <span className="text-sm text-ink-3">laid {sayDay(clutch.laidOn)}</span>
              </span>
            ))}
          </Line>
        ) : null}
      </dl>
    </section>
  );
}
