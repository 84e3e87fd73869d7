'use client';

import Link from 'next/link';
import { AnimalCode } from '@/components/collection/animal-code';
import { useShares } from '@/components/collection/shares-of';
import { sayGrams } from '@/components/collection/words';
import { AllelePair } from '@/components/drawings/allele-pair';
import { percentText } from '@/components/drawings/odds-bar';
import { ShareStrip } from '@/components/drawings/share-strip';
import { useWorkspace } from '@/lib/client/workspace';
import type { SeenFigures } from '@/lib/contracts/pairing';
import type { ParentFigures } from '@/lib/contracts/pairing-figures';
import { sayMonths } from './odds-words';

/** Both parents side by side: copies per locus, age, weight and owners; then how related their young would be. */
export function ParentsTable({ figures }: { figures: SeenFigures }) {
  const { slug } = useWorkspace();
  const shares = useShares();
  const { sire, dam } = figures.parents;
  const line = (label: string, value: (parent: ParentFigures) => React.ReactNode) => (
    <tr key={label} className="border-b border-rule-2">
      <th scope="row" className="py-2 pr-3 text-left text-base font-normal text-ink-2">
        {label}
      </th>
      <td className="py-2 pr-3">{value(sire)}</td>
      <td className="py-2">{value(dam)}</td>
    </tr>
  );
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Parents">
      <table className="w-full text-base">
        <thead>
          <tr className="border-b border-rule text-left text-sm text-ink-3">
            <td />
            {(
              [
                ['sire', sire, 'male'],
                ['dam', dam, 'female'],
              ] as const
            ).map(([word, parent, sex]) => (
              <th key={word} scope="col" className="pb-2 font-normal">
                {word}{' '}
                <Link href={`/${slug}/collection/${parent.id}`} className="hover:underline">
                  <AnimalCode code={parent.code} sex={sex} size="sm" />
                </Link>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {sire.loci.map((locus, index) =>
            line(locus.name, (parent) => {
              const own = parent.loci[index];
              if (!own) return null;
              return (
                <span className="inline-flex flex-wrap items-center gap-2">
                  <AllelePair locus={own.name} copies={own.copies} note={own.words} />
                  {own.copies.some(({ probability }) => probability > 0 && probability < 1) ? (
                    <span className="text-sm text-ink-2">{own.words}</span>
                  ) : null}
                </span>
              );
            }),
          )}
          {line('Age', (parent) => (
            <span className="font-mono">{sayMonths(parent.ageMonths)}</span>
          ))}
          {line('Weight', (parent) => (
            <span className="font-mono">
              {parent.grams === null ? 'not weighed' : sayGrams(parent.grams)}
            </span>
          ))}
          {line('Owned by', (parent) => (
            <ShareStrip
              shares={shares(parent.parts)}
              size="sm"
              label={`${parent.code} is owned by`}
              className="min-w-24"
            />
          ))}
        </tbody>
      </table>
      <p className="mt-3 flex justify-between gap-4 text-base">
        <span>Inbreeding of the young</span>
        <span className="font-mono">{percentText(figures.inbreeding)}</span>
      </p>
      {figures.commonAncestors.length > 0 ? (
        <ul className="mt-1 text-sm text-ink-3">
          {figures.commonAncestors.map((ancestor) => (
            <li key={ancestor}>Common ancestor: {ancestor}</li>
          ))}
        </ul>
      ) : (
        <p className="mt-1 text-sm text-ink-3">No common ancestor is recorded.</p>
      )}
    </div>
  );
}
