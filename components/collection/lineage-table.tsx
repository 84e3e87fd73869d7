'use client';

import Link from 'next/link';
import { LineageSymbol } from '@/components/drawings/lineage-symbol';
import { PlainTable } from '@/components/ui/plain-table';
import { useWorkspace } from '@/lib/client/workspace';
import type { Lineage } from '@/lib/contracts/lineage';
import { sexWords } from './words';

/** Everything that the graph says, in rows: sex, parents, young, locus, matings of relatives. */
export function LineageTable({ lineage, focused }: { lineage: Lineage; focused: string | null }) {
  const { slug } = useWorkspace();
  const byKey = new Map(lineage.nodes.map((node) => [node.key, node]));
  const young = new Map<string, string[]>();
  for (const node of lineage.nodes) {
    for (const parent of [node.sire, node.dam, ...node.possibleSires])
      if (parent) young.set(parent, [...(young.get(parent) ?? []), node.key]);
  }
  const related = new Set(lineage.relatedMates.map((pair) => pair.join(' ')));
  const name = (key: string) => {
    const node = byKey.get(key);
    if (!node?.shown) return <span className="text-ink-3 italic">not shown</span>;
    return (
      <Link href={`/${slug}/collection/${key}`} className="font-mono text-slate underline underline-offset-2">
        {node.code}
      </Link>
    );
  };
  const list = (keys: readonly string[], between = ', ') =>
    keys.length
      ? keys.map((key, index) => (
          <span key={key}>
            {index > 0 ? between : ''}
            {name(key)}
          </span>
        ))
      : '–';
  return (
    <PlainTable
      label="Lineage as a table"
      rows={lineage.nodes}
      rowKey={(node) => node.key}
      columns={[
        {
          id: 'animal',
          header: 'Animal',
          cell: (node) => (
            <span className="flex items-center gap-2 whitespace-nowrap">
              <LineageSymbol
                sex={node.sex}
                shows={node.fill?.shows}
                carries={node.fill?.carries}
                dead={node.status === 'died'}
                hidden={!node.shown}
              />
              {name(node.key)}
              {node.key === focused ? <span className="text-sm text-ink-3">chosen</span> : null}
            </span>
          ),
        },
        { id: 'sex', header: 'Sex', cell: (node) => sexWords[node.sex] },
        { id: 'looks', header: 'Looks and carries', cell: (node) => node.description || '–' },
        ...(lineage.nodes.some(({ fill }) => fill)
          ? [
              {
                id: 'locus',
                header: 'At the locus',
                cell: (node: Lineage['nodes'][number]) => node.fill?.words ?? '–',
              },
            ]
          : []),
        {
          id: 'sire',
          header: 'Sire',
          cell: (node) => (node.sire ? name(node.sire) : list(node.possibleSires, ' or ')),
        },
        { id: 'dam', header: 'Dam', cell: (node) => (node.dam ? name(node.dam) : '–') },
        {
          id: 'parents',
          header: 'Parents related',
          cell: (node) =>
            [node.sire, ...node.possibleSires].some((sire) => related.has(`${sire} ${node.dam}`))
              ? 'yes'
              : '–',
        },
        { id: 'young', header: 'Young', cell: (node) => list(young.get(node.key) ?? []) },
      ]}
    />
  );
}
