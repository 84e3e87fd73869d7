'use client';

import { useState } from 'react';
import { Segmented } from '@/components/ui/segmented';
import type { PunnettSquare } from '@/lib/contracts/pairing-figures';

/** One Punnett square at a time: his gametes across, hers down; cells that show something are tinted. */
export function PunnettSquares({ squares }: { squares: readonly PunnettSquare[] }) {
  const [chosen, setChosen] = useState('0');
  const square = squares[Number(chosen)] ?? squares[0];
  if (!square) return null;
  return (
    <div className="flex flex-col gap-3">
      {squares.length > 1 ? (
        <div className="overflow-x-auto">
          <Segmented
            label="Loci of the square"
            value={chosen}
            onChange={setChosen}
            options={squares.map(({ title }, index) => ({ value: String(index), label: title }))}
          />
        </div>
      ) : null}
      <Square square={square} />
      {square.note ? <p className="text-sm text-ink-3">{square.note}</p> : null}
    </div>
  );
}

function Square({ square }: { square: PunnettSquare }) {
  return (
    <div
      className="overflow-x-auto"
      tabIndex={0}
      role="region"
      aria-label={`Punnett square: ${square.title}`}
    >
      <table className="w-full border-separate border-spacing-1 text-center font-mono text-sm">
        <caption className="sr-only">
          {square.title}: gametes of the sire in columns, of the dam in rows
        </caption>
        <thead>
          <tr>
            <th scope="col" className="w-20 text-left font-sans font-normal text-ink-3">
              <span aria-hidden>♀ \ ♂</span>
              <span className="sr-only">Dam’s gamete</span>
            </th>
            {square.columns.map((column, index) => (
              <th key={index} scope="col" className="px-2 py-1 font-medium whitespace-nowrap text-ink-2">
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {square.cells.map((cells, row) => (
            <tr key={row}>
              <th scope="row" className="px-2 py-1 text-left font-medium whitespace-nowrap text-ink-2">
                {square.rows[row]}
              </th>
              {cells.map((cell, column) => (
                <td
                  key={column}
                  className={`rounded-sm px-1 py-1.5 align-top ${cell.looksLike ? 'bg-ember-tint text-ember-deep' : 'bg-rule-2 text-ink'}`}
                >
                  {cell.genotype.split(' · ').map((genotype, locus) => (
                    <span key={locus} className="block leading-4 font-semibold whitespace-nowrap">
                      {genotype}
                    </span>
                  ))}
                  <span className="block font-sans text-tick">{cell.looksLike || 'normal'}</span>
                  <span className="block text-tick">{cell.odds}</span>
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
