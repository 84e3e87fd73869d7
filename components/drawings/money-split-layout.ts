/** What is taken from an amount in one step. `partner` gives the partner's colour and pattern, `tone` all others. */
export type MoneyCut = {
  label: string;
  /** Integer minor units, 0 or more. */
  amount: number;
  tone?: 'slate' | 'straw' | 'alarm' | 'moss' | 'ember' | 'neutral';
  partner?: number;
  note?: string;
};

/** An amount and what is cut from it; the next step holds exactly what is left. */
export type MoneyStep = { label: string; amount: number; cuts: MoneyCut[] };

/** A piece of a row: where it starts and how wide it is, and where it was part of the row above (all in % of the width). */
export type SplitPiece = { left: number; width: number; fromLeft: number; cut: MoneyCut | null };

export type SplitRow = {
  /** The step whose bar leads the row; null for the last row, where everything has been handed out. */
  step: MoneyStep | null;
  pieces: SplitPiece[];
};

const GAP = 1.4;

/** True when every step holds exactly what the step before has left, and no step hands out more than it has. */
export function stepsAddUp(steps: readonly MoneyStep[]): boolean {
  return steps.every((step, index) => {
    const amounts = [step.amount, ...step.cuts.map((cut) => cut.amount)];
    if (amounts.some((amount) => !Number.isSafeInteger(amount) || amount < 0)) return false;
    const left = step.amount - step.cuts.reduce((sum, cut) => sum + cut.amount, 0);
    const next = steps[index + 1];
    return next ? next.amount === left : left >= 0;
  });
}

/**
 * Rows of bars for steps that add up: one scale for all rows, so that the same money is equally wide everywhere. Pieces
 * of a row stand apart by a gap, for which the scale leaves room. Throws `RangeError` for steps that do not add up.
 */
export function layOutSplit(steps: readonly MoneyStep[]): SplitRow[] {
  if (!stepsAddUp(steps)) throw new RangeError('the steps of this split do not add up');
  const first = steps[0];
  if (!first || first.amount === 0) return [];

  const drafts = steps.map((step, index) => {
    const cuts = step.cuts.filter((cut) => cut.amount > 0);
    const handedOut = cuts.reduce((sum, cut) => sum + cut.amount, 0);
    const next = steps[index + 1] ?? null;
    const left = step.amount - handedOut;
    const rest = next
      ? { step: next, amount: left }
      : left > 0
        ? { step: { label: 'Left', amount: left, cuts: [] }, amount: left }
        : null;
    const keepsRest = rest !== null && rest.amount > 0;
    return { amount: step.amount, cuts, rest: keepsRest ? rest : null };
  });
  const scale = Math.min(
    100 / first.amount,
    ...drafts
      .filter((draft) => draft.amount > 0)
      .map((draft) => (100 - GAP * (draft.cuts.length - (draft.rest ? 0 : 1))) / draft.amount),
  );

  const rows: SplitRow[] = [
    { step: first, pieces: [{ left: 0, width: first.amount * scale, fromLeft: 0, cut: null }] },
  ];
  for (const draft of drafts) {
    if (draft.cuts.length === 0) continue;
    let left = 0;
    let fromLeft = 0;
    const pieces: SplitPiece[] = [];
    const add = (amount: number, cut: MoneyCut | null) => {
      pieces.push({ left, width: amount * scale, fromLeft, cut });
      left += amount * scale + GAP;
      fromLeft += amount * scale;
    };
    if (draft.rest) add(draft.rest.amount, null);
    for (const cut of draft.cuts) add(cut.amount, cut);
    rows.push({ step: draft.rest?.step ?? null, pieces });
  }
  return rows;
}
