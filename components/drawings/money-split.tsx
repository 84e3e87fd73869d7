import { classNames } from '@/components/ui/class-names';
import { layOutSplit, stepsAddUp, type MoneyCut, type MoneyStep, type SplitRow } from './money-split-layout';
import { partnerMark } from './partner-marks';
import { PatternFill, PatternSwatch } from './pattern-fill';

export type { MoneyCut, MoneyStep } from './money-split-layout';

const toneFill = {
  slate: 'var(--slate)',
  straw: 'var(--straw)',
  alarm: 'var(--alarm)',
  moss: 'var(--moss)',
  ember: 'var(--ember)',
  neutral: 'var(--ink-3)',
};

const stepFills = ['bg-ink', 'bg-ink-2', 'bg-ink-3'];

function markOf(cut: MoneyCut) {
  if (cut.partner !== undefined) return partnerMark(cut.partner);
  const fill = toneFill[cut.tone ?? 'slate'];
  return { pattern: 'solid' as const, fill, line: fill, text: fill };
}

/**
 * Money cut step by step, from what was paid down to each partner's cents. The same money is equally wide in every row.
 * Amounts come as integer minor units and are written by `format`.
 */
export function MoneySplit({
  steps,
  format,
  label = 'How the money was split',
}: {
  steps: readonly MoneyStep[];
  format: (minorUnits: number) => string;
  label?: string;
}) {
  const drawable = stepsAddUp(steps);
  const rows = drawable ? layOutSplit(steps) : [];
  return (
    <div role="group" aria-label={label} className="@container">
      {rows.length > 0 ? (
        <div aria-hidden>
          {rows.map((row, index) => (
            <Row key={index} row={row} depth={index} format={format} last={index === rows.length - 1} />
          ))}
        </div>
      ) : null}
      {/* Says the same as the drawing; in sight only where nothing can be drawn. */}
      <div className={drawable && rows.length > 0 ? 'sr-only' : undefined}>
        <SplitTable steps={steps} format={format} label={label} />
      </div>
    </div>
  );
}

function Ribbons({ row }: { row: SplitRow }) {
  return (
    <svg viewBox="0 0 100 10" preserveAspectRatio="none" className="block h-6 w-full overflow-visible">
      {row.pieces.map((piece, index) => (
        <path
          key={index}
          d={`M${piece.fromLeft} 0 H${piece.fromLeft + piece.width} L${piece.left + piece.width} 10 H${piece.left} Z`}
          fill={piece.cut ? markOf(piece.cut).fill : 'var(--ink-3)'}
          opacity={piece.cut ? 0.22 : 0.16}
        />
      ))}
    </svg>
  );
}

function Row({
  row,
  depth,
  format,
  last,
}: {
  row: SplitRow;
  depth: number;
  format: (minorUnits: number) => string;
  last: boolean;
}) {
  const { step } = row;
  const lead = row.pieces.find((piece) => piece.cut === null);
  const cuts = row.pieces.flatMap((piece) => (piece.cut ? [{ ...piece, cut: piece.cut }] : []));
  const roomy = (lead?.width ?? 0) >= 58;
  return (
    <>
      {depth > 0 ? <Ribbons row={row} /> : null}
      {step && !roomy ? (
        <p className="flex flex-wrap justify-between gap-x-4 bg-paper py-0.5 text-base">
          <span className="font-semibold">{step.label}</span>
          <span className="font-mono">{format(step.amount)}</span>
        </p>
      ) : null}
      <div className={classNames('relative', step ? 'min-h-9' : 'h-10')}>
        {step && lead ? (
          <div
            className={classNames(
              'flex min-h-9 flex-wrap items-center justify-between gap-x-4 rounded-[2px] px-2.5 py-1 text-base leading-5 text-paper',
              stepFills[Math.min(depth, stepFills.length - 1)],
            )}
            style={{ width: `${lead.width}%` }}
          >
            {roomy ? (
              <>
                <span className="font-semibold">{step.label}</span>
                <span className="font-mono">{format(step.amount)}</span>
              </>
            ) : null}
          </div>
        ) : null}
        {cuts.map(({ cut, left, width }, index) => (
          <div
            key={index}
            className="absolute inset-y-0 overflow-hidden rounded-[2px]"
            style={{ left: `${left}%`, width: `max(3px, ${width}%)` }}
          >
            <PatternFill mark={markOf(cut)} scale={7} />
          </div>
        ))}
      </div>
      {cuts.length === 0 ? null : last && !step ? (
        <Receivers cuts={cuts} format={format} />
      ) : (
        <div className="relative">
          {lead && !last ? (
            <div className="absolute inset-y-0 left-0 bg-ink-3/16" style={{ width: `${lead.width}%` }} />
          ) : null}
          <ul className="relative flex flex-wrap justify-end gap-x-5 gap-y-0.5 py-1.5 pl-2 text-sm">
            {cuts.map(({ cut }, index) => (
              <li key={index} className="flex items-baseline gap-1.5">
                <PatternSwatch mark={markOf(cut)} className="size-2.5" />
                <span className="text-ink">
                  {cut.label}
                  {cut.note ? <span className="text-ink-2">, {cut.note}</span> : null}
                </span>
                <span className="font-mono whitespace-nowrap text-ink">{format(cut.amount)}</span>
              </li>
            ))}
          </ul>
        </div>
      )}
    </>
  );
}

function Receivers({
  cuts,
  format,
}: {
  cuts: { cut: MoneyCut; width: number }[];
  format: (minorUnits: number) => string;
}) {
  // Columns under their bars only where the narrowest bar has room for its amount.
  const roomy = cuts.every(({ width }) => width >= 17);
  return (
    <>
      <ul
        className={classNames('mt-2 hidden gap-x-[1.4%]', roomy && '@lg:grid')}
        style={{ gridTemplateColumns: cuts.map(({ width }) => `${width}%`).join(' ') }}
      >
        {cuts.map(({ cut }, index) => (
          <li key={index} className="text-base">
            <span className="block font-semibold" style={{ color: markOf(cut).text }}>
              {cut.label}
            </span>
            <span className="block font-mono text-lg">{format(cut.amount)}</span>
            {cut.note ? <span className="block max-w-40 text-sm text-ink-3">{cut.note}</span> : null}
          </li>
        ))}
      </ul>
      <ul className={classNames('mt-2 max-w-md space-y-1.5', roomy && '@lg:hidden')}>
        {cuts.map(({ cut }, index) => (
          <li
            key={index}
            className="grid grid-cols-[auto_minmax(0,1fr)_auto] items-baseline gap-x-2 text-base"
          >
            <PatternSwatch mark={markOf(cut)} />
            <span>
              <span className="font-semibold" style={{ color: markOf(cut).text }}>
                {cut.label}
              </span>
              {cut.note ? <span className="block text-sm text-ink-3">{cut.note}</span> : null}
            </span>
            <span className="font-mono">{format(cut.amount)}</span>
          </li>
        ))}
      </ul>
    </>
  );
}

function SplitTable({
  steps,
  format,
  label,
}: {
  steps: readonly MoneyStep[];
  format: (minorUnits: number) => string;
  label: string;
}) {
  return (
    <table className="w-full text-base">
      <caption className="sr-only">{label}</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">What</th>
          <th scope="col">Amount</th>
        </tr>
      </thead>
      <tbody>
        {steps.flatMap((step, index) => [
          <tr key={`step-${index}`}>
            <th scope="row" className="py-1 text-left font-semibold">
              {step.label}
            </th>
            <td className="text-right font-mono">{format(step.amount)}</td>
          </tr>,
          ...step.cuts.map((cut, at) => (
            <tr key={`cut-${index}-${at}`}>
              <th scope="row" className="py-1 pl-4 text-left font-normal">
                {cut.label}
                {cut.note ? `, ${cut.note}` : ''}
              </th>
              <td className="text-right font-mono">−{format(cut.amount)}</td>
            </tr>
          )),
        ])}
      </tbody>
    </table>
  );
}
