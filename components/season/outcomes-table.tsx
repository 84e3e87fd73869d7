import { percentText } from '@/components/drawings/odds-bar';
import { PlainTable, type PlainColumn } from '@/components/ui/plain-table';
import type { SeenFigures } from '@/lib/contracts/pairing';
import { formatMoney } from '@/lib/money/minor-units';
import type { ReactNode } from 'react';
import { readableOdds } from './odds-words';

type Outcome = SeenFigures['outcomes'][number];

const sexWord = { male: 'males', female: 'females' } as const;

/** What can hatch: looks, what they carry, the odds of an egg and of at least one in the clutch, and what one is worth. */
export function OutcomesTable({
  figures,
  currency,
  price,
}: {
  figures: SeenFigures;
  currency: string;
  price?: (row: Outcome) => ReactNode;
}) {
  const showsWorth =
    price !== undefined || figures.outcomes.some((row) => row.price !== undefined && row.price !== null);
  const columns: PlainColumn<Outcome>[] = [
    {
      id: 'looks',
      header: 'Looks like',
      cell: (row) => (
        <span className="block min-w-28">
          <span className="font-semibold">{row.looksLike}</span>
          {row.sex ? <span className="text-ink-3"> ({sexWord[row.sex]})</span> : null}
          {row.carries ? <span className="block text-sm text-ink-2">{row.carries}</span> : null}
          <span aria-hidden className="mt-1 block h-2 overflow-hidden rounded-[2px] bg-track">
            <span
              className="block h-full rounded-[2px] bg-slate"
              style={{ width: `${row.probability * 100}%`, minWidth: 2 }}
            />
          </span>
        </span>
      ),
    },
    {
      id: 'odds',
      header: 'odds',
      align: 'end',
      cell: (row) => (
        <>
          {readableOdds(row.odds) ? <span className="block">{row.odds}</span> : null}
          <span className={readableOdds(row.odds) ? 'block text-sm text-ink-3' : 'block'} title={row.odds}>
            {percentText(row.probability)}
          </span>
        </>
      ),
    },
    {
      id: 'least',
      header: `≥ 1 of ${figures.eggsExpected}`,
      align: 'end',
      cell: (row) => percentText(row.atLeastOne),
    },
  ];
  if (showsWorth) {
    columns.push({
      id: 'worth',
      header: 'worth',
      align: 'end',
      cell: (row) =>
        price ? (
          price(row)
        ) : row.price === null || row.price === undefined ? (
          <span className="text-ink-3">no price</span>
        ) : (
          formatMoney(row.price, currency)
        ),
    });
  }
  return (
    <>
      <PlainTable
        label="What can hatch"
        columns={columns}
        rows={figures.outcomes}
        rowKey={(row) => row.key}
      />
      {figures.leftOut > 0 ? (
        <p className="mt-2 text-sm text-ink-3">
          Rarer looks, {percentText(figures.leftOut)} together, are left out of the table.
        </p>
      ) : null}
      {figures.lethal !== '0' ? (
        <p className="mt-2 text-sm text-straw">
          {figures.lethal} of the eggs would not live: a lethal genotype.
        </p>
      ) : null}
    </>
  );
}
