import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { colourOf, colourTokens, typeScale, type ColourToken, type Theme } from '@/components/ui/tokens';
import { contrastRatio } from './contrast-ratio';

// WCAG 2.2, success criteria 1.4.3 (text, 4.5:1) and 1.4.11 (controls and marks, 3:1).
const TEXT = 4.5;
const MARK = 3;

const surfaces: ColourToken[] = ['shell', 'paper', 'card', 'hover', 'chosen'];
const meanings = ['ember', 'slate', 'moss', 'straw', 'alarm'] as const;
const partners = [1, 2, 3, 4, 5, 6, 7, 8] as const;

const textPairs: [text: ColourToken, surface: ColourToken][] = [
  ...surfaces.flatMap((surface): [ColourToken, ColourToken][] => [
    ['ink', surface],
    ['ink-2', surface],
    ['ink-3', surface],
    ...meanings.map((meaning): [ColourToken, ColourToken] => [meaning, surface]),
    ...partners.map((n): [ColourToken, ColourToken] => [`partner-${n}-text`, surface]),
  ]),
  ...meanings.flatMap((meaning): [ColourToken, ColourToken][] => [
    [`${meaning}-deep`, `${meaning}-tint`],
    ['ink', `${meaning}-tint`],
    [`on-${meaning}`, meaning],
  ]),
  ['on-ember', 'ember-hover'],
  ['on-alarm', 'alarm-hover'],
  // the steps of a money split write on ink in three strengths
  ['paper', 'ink'],
  ['paper', 'ink-2'],
  ['paper', 'ink-3'],
  ...(['rail-ink', 'rail-ink-2', 'rail-ember'] as const).flatMap((text): [ColourToken, ColourToken][] => [
    [text, 'rail'],
    [text, 'rail-2'],
  ]),
  ['rail-ink', 'rack'],
  ['rail-ink-2', 'rack'],
  ...(['tub-settled', 'tub-due', 'tub-shed', 'tub-quarantine', 'tub-alarm'] as const).map(
    (tub): [ColourToken, ColourToken] => ['tub-ink', tub],
  ),
  ['tub-empty-ink', 'tub-empty'],
];

const markPairs: [mark: ColourToken, surface: ColourToken][] = [
  ...surfaces.flatMap((surface): [ColourToken, ColourToken][] => [
    ['edge', surface],
    ['focus', surface],
    ...partners.map((n): [ColourToken, ColourToken] => [`partner-${n}`, surface]),
  ]),
  // a pattern has to be seen within its area, and a measure against its empty part
  ...partners.map((n): [ColourToken, ColourToken] => [`partner-${n}-line`, `partner-${n}`]),
  ...meanings.map((meaning): [ColourToken, ColourToken] => [meaning, 'track']),
  ['rail-ember', 'rail'],
];

describe.each<Theme>(['light', 'dark'])('colours of the %s theme', (theme) => {
  const ratio = (a: ColourToken, b: ColourToken) => contrastRatio(colourOf(a, theme), colourOf(b, theme));

  it.each(textPairs)('text %s can be read on %s', (text, surface) => {
    expect(ratio(text, surface)).toBeGreaterThanOrEqual(TEXT);
  });

  it.each(markPairs)('mark %s can be seen on %s', (mark, surface) => {
    expect(ratio(mark, surface)).toBeGreaterThanOrEqual(MARK);
  });
});

describe('where colours and sizes are kept', () => {
  it('keeps every colour in the tokens, none in the style sheet', () => {
    const css = readFileSync('app/globals.css', 'utf8');
    expect(css).not.toMatch(/#[0-9a-f]{3,8}\b/i);
    const used = [...css.matchAll(/var\(--([a-z0-9-]+)\)/g)].map((match) => match[1]);
    expect(used.length).toBeGreaterThan(5);
    const known = new Set<string>(colourTokens);
    expect(used.filter((name) => !known.has(name ?? ''))).toEqual([]);
  });

  it('has no type under 13 px but ticks', () => {
    const small = Object.entries(typeScale).filter(([, [size]]) => size < 13);
    expect(small).toEqual([['tick', [12, 16]]]);
  });

  it('agrees with the known extremes of the measure', () => {
    // WCAG 2.2 defines black on white as 21:1 and a colour on itself as 1:1; #767676 on white is the known edge of 4.5.
    expect(contrastRatio('#000000', '#FFFFFF')).toBeCloseTo(21, 6);
    expect(contrastRatio('#B8461F', '#B8461F')).toBe(1);
    expect(contrastRatio('#767676', '#FFFFFF')).toBeGreaterThanOrEqual(4.5);
    expect(contrastRatio('#777777', '#FFFFFF')).toBeLessThan(4.5);
  });
});
