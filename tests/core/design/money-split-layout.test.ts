import { describe, expect, it } from 'vitest';
import { layOutSplit, stepsAddUp, type MoneyStep } from '@/components/drawings/money-split-layout';

const sale: MoneyStep[] = [
  {
    label: 'Paid',
    amount: 128480,
    cuts: [
      { label: 'Tax', amount: 7480 },
      { label: 'Shipping', amount: 6000 },
    ],
  },
  {
    label: 'Price',
    amount: 115000,
    cuts: [
      { label: 'Fee', amount: 3756 },
      { label: 'House', amount: 9200 },
    ],
  },
  {
    label: 'Left',
    amount: 102044,
    cuts: [
      { label: 'A', amount: 51022, partner: 0 },
      { label: 'B', amount: 25511, partner: 1 },
      { label: 'C', amount: 25511, partner: 2 },
    ],
  },
];

describe('the drawing of a split', () => {
  it('draws the same money equally wide in every row, and all of it', () => {
    const rows = layOutSplit(sale);
    expect(rows).toHaveLength(4);
    const widths = rows.map((row) => row.pieces.reduce((sum, piece) => sum + piece.width, 0));
    const [paid = 0, price = 0, left = 0, shared = 0] = widths;
    expect(price).toBeCloseTo(paid, 9);
    expect(left / paid).toBeCloseTo(115000 / 128480, 9);
    expect(shared / paid).toBeCloseTo(102044 / 128480, 9);
  });

  it('keeps every piece within the width and apart from its neighbour', () => {
    for (const row of layOutSplit(sale)) {
      row.pieces.forEach((piece, index) => {
        expect(piece.left + piece.width).toBeLessThanOrEqual(100 + 1e-9);
        const next = row.pieces[index + 1];
        if (next) expect(next.left).toBeGreaterThan(piece.left + piece.width);
      });
    }
  });

  it('refuses steps between which money appears or disappears', () => {
    const [paid, ...rest] = sale;
    if (!paid) throw new Error('the sale has no first step');
    const wrong = [{ ...paid, amount: paid.amount + 1 }, ...rest];
    expect(stepsAddUp(wrong)).toBe(false);
    expect(() => layOutSplit(wrong)).toThrow(RangeError);
    expect(stepsAddUp([{ label: 'Paid', amount: 100, cuts: [{ label: 'Fee', amount: 101 }] }])).toBe(false);
    expect(stepsAddUp([{ label: 'Paid', amount: 100, cuts: [{ label: 'Fee', amount: -1 }] }])).toBe(false);
  });

  it('shows what nobody has got yet', () => {
    const rows = layOutSplit([{ label: 'Paid', amount: 100, cuts: [{ label: 'Fee', amount: 10 }] }]);
    expect(rows[1]?.step).toEqual({ label: 'Left', amount: 90, cuts: [] });
  });
});
