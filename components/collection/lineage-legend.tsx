import type { ReactNode } from 'react';
import { LineageSymbol } from '@/components/drawings/lineage-symbol';

function Entry({ sign, children }: { sign: ReactNode; children: ReactNode }) {
  return (
    <li className="flex items-center gap-2 whitespace-nowrap">
      {sign}
      {children}
    </li>
  );
}

function Line({ double = false, dashed = false }: { double?: boolean; dashed?: boolean }) {
  return (
    <svg aria-hidden viewBox="0 0 24 12" className="h-3 w-6 text-ink">
      {(double ? [4, 8] : [6]).map((y) => (
        <path
          key={y}
          d={`M0 ${y}H24`}
          stroke="currentColor"
          strokeWidth="1.4"
          strokeDasharray={dashed ? '3 2.5' : undefined}
        />
      ))}
    </svg>
  );
}

/** What the symbols and lines of the graph mean. */
export function LineageLegend({ locus }: { locus: string | null }) {
  return (
    <ul aria-label="Legend" className="flex flex-wrap gap-x-5 gap-y-2 text-sm text-ink-2">
      <Entry sign={<LineageSymbol sex="male" />}>male</Entry>
      <Entry sign={<LineageSymbol sex="female" />}>female</Entry>
      <Entry sign={<LineageSymbol sex="unknown" />}>sex unknown</Entry>
      {locus ? (
        <>
          <Entry sign={<LineageSymbol sex="male" shows />}>shows {locus}</Entry>
          <Entry sign={<LineageSymbol sex="male" carries={1} />}>carries it</Entry>
          <Entry sign={<LineageSymbol sex="male" carries={0.66} />}>may carry it, filled to the odds</Entry>
        </>
      ) : null}
      <Entry sign={<LineageSymbol sex="female" dead />}>died</Entry>
      <Entry sign={<LineageSymbol sex="male" hidden />}>not shown to you</Entry>
      <Entry sign={<Line double />}>relatives mated</Entry>
      <Entry sign={<Line dashed />}>possible sire</Entry>
    </ul>
  );
}
