import type { ColourToken } from '@/components/ui/tokens';

export type PatternKind =
  'solid' | 'diagonal' | 'vertical' | 'dots' | 'horizontal' | 'cross' | 'back-diagonal' | 'checks';

export type PartnerMark = {
  /** Position in the workspace's fixed order of partners, from 0. */
  index: number;
  pattern: PatternKind;
  fill: string;
  line: string;
  text: string;
};

const patterns: readonly PatternKind[] = [
  'solid',
  'diagonal',
  'vertical',
  'dots',
  'horizontal',
  'cross',
  'back-diagonal',
  'checks',
];

const variable = (token: ColourToken) => `var(--${token})`;

// Hues after the set of Okabe and Ito (2008), which people with the common colour deficiencies tell apart; darkened for
// the light theme and lightened for the dark one until each meets 3:1 on every surface. The values stand in ui/tokens.
const marks: readonly PartnerMark[] = ([1, 2, 3, 4, 5, 6, 7, 8] as const).map((number, index) => ({
  index,
  pattern: patterns[index] ?? 'solid',
  fill: variable(`partner-${number}`),
  line: variable(`partner-${number}-line`),
  text: variable(`partner-${number}-text`),
}));

/** The house: what is kept for the building before partners share; also tax, fees and shipping that are passed on. */
export const houseMark: Omit<PartnerMark, 'index'> = {
  pattern: 'solid',
  fill: 'var(--straw)',
  line: 'var(--on-straw)',
  text: 'var(--straw)',
};

/**
 * Colour and pattern of a partner by its position in the fixed order, from 0. From the ninth partner on the colours
 * come again with the next pattern, so that no two of 64 are the same.
 */
export function partnerMark(index: number): PartnerMark {
  const colour = ((index % 8) + 8) % 8;
  const round = Math.floor(Math.abs(index) / 8);
  const mark = marks[colour];
  if (!mark) throw new RangeError(`no mark for partner ${index}`);
  return { ...mark, index, pattern: patterns[(colour + round) % 8] ?? 'solid' };
}
