/**
 * Every colour of the product, in the light and the dark theme. `tailwind.config.ts` writes them as CSS variables
 * (`--ember` …) and names them for class names (`bg-ember`, `text-ink-2`); nothing else in the tree holds a colour.
 * A name ending in `-tint` is a surface, `-deep` the text that stands on that tint, `on-…` the text on a filled area.
 */
export type Theme = 'light' | 'dark';

type TokenPair = readonly [light: string, dark: string];

const pairs = {
  // surfaces
  shell: ['#F3EFE6', '#14181A'],
  paper: ['#FDFBF6', '#1C2225'],
  card: ['#FFFFFF', '#22292D'],
  hover: ['#F6F2E9', '#262E32'],
  chosen: ['#FBF1E6', '#2F2B26'],
  // text
  ink: ['#191C1F', '#F0EADC'],
  'ink-2': ['#4B5257', '#C4CACB'],
  'ink-3': ['#5F676C', '#9AA3A6'],
  // lines: rule and rule-2 part areas, edge outlines a control, track is the empty part of a measure
  rule: ['#DDD6C7', '#343D42'],
  'rule-2': ['#EBE6DA', '#2A3236'],
  edge: ['#878071', '#727D82'],
  track: ['#E7E1D3', '#343D42'],
  focus: ['#0B5F93', '#8FC7EE'],
  // meanings
  ember: ['#B8461F', '#E08A4B'],
  'ember-hover': ['#9C3A18', '#EBA068'],
  'ember-tint': ['#F8E4D8', '#3A2A1F'],
  'ember-deep': ['#8A3214', '#F2B98F'],
  'on-ember': ['#FFFFFF', '#17120D'],
  slate: ['#3F6377', '#8FB2C4'],
  'slate-tint': ['#DEE8ED', '#22333D'],
  'slate-deep': ['#26424F', '#B9D2DE'],
  'on-slate': ['#FFFFFF', '#10181C'],
  moss: ['#3E6B4B', '#7FB08C'],
  'moss-tint': ['#DFEADF', '#22342A'],
  'moss-deep': ['#2A4F35', '#B1D3BA'],
  'on-moss': ['#FFFFFF', '#0F1912'],
  straw: ['#8A6410', '#E3BF62'],
  'straw-tint': ['#F6EBCB', '#3A321D'],
  'straw-deep': ['#664806', '#EBD08B'],
  'on-straw': ['#FFFFFF', '#1A1505'],
  alarm: ['#A61B1B', '#F08A80'],
  'alarm-hover': ['#8A1414', '#F5A69E'],
  'alarm-tint': ['#F8DFDC', '#402422'],
  'alarm-deep': ['#831414', '#F7B8B1'],
  'on-alarm': ['#FFFFFF', '#210B09'],
  // the rail and other surfaces that are dark in both themes
  rail: ['#1D2326', '#0F1315'],
  'rail-2': ['#2D3539', '#22292D'],
  'rail-ink': ['#F0EADC', '#F0EADC'],
  'rail-ink-2': ['#BFC5C5', '#B3BABB'],
  'rail-ember': ['#E9A06C', '#E9A06C'],
  // the wall: a rack and its tubs by state
  rack: ['#2B3135', '#0D1113'],
  'tub-settled': ['#E8E2D4', '#566168'],
  'tub-due': ['#F5C9A8', '#8A4B26'],
  'tub-shed': ['#C6D7E0', '#3F6377'],
  'tub-quarantine': ['#F3E5B8', '#6E5A22'],
  'tub-quarantine-2': ['#DDBF6A', '#A8893A'],
  'tub-alarm': ['#F2B8B0', '#8C3A34'],
  'tub-empty': ['#3B4348', '#1E2528'],
  'tub-ink': ['#2B3135', '#F0EADC'],
  'tub-empty-ink': ['#B9C0C2', '#9AA3A6'],
  veil: ['rgb(20 24 26 / 0.45)', 'rgb(0 0 0 / 0.6)'],
} as const satisfies Record<string, TokenPair>;

/** Partners in their fixed order: the area's colour, the lines of its pattern, and the partner's name as text. */
const partnerPairs = {
  'partner-1': ['#0B5F93', '#6FB6E3'],
  'partner-1-line': ['#8FC3E4', '#123A52'],
  'partner-1-text': ['#0B5F93', '#8CC6EC'],
  'partner-2': ['#B84F0C', '#EE8E4A'],
  'partner-2-line': ['#F6C9A4', '#5E2A05'],
  'partner-2-text': ['#9C4108', '#F3A670'],
  'partner-3': ['#0A7558', '#4FC19D'],
  'partner-3-line': ['#93DCC2', '#0A4535'],
  'partner-3-text': ['#086149', '#6FD0B0'],
  'partner-4': ['#98457C', '#DE93C0'],
  'partner-4-line': ['#F0C4DF', '#571F45'],
  'partner-4-text': ['#87386C', '#E8AACF'],
  'partner-5': ['#8F6500', '#EBB03A'],
  'partner-5-line': ['#F5D894', '#5A3F00'],
  'partner-5-text': ['#745100', '#F0C063'],
  'partner-6': ['#2878A5', '#9AD2F5'],
  'partner-6-line': ['#CDE9F9', '#24536D'],
  'partner-6-text': ['#1D658E', '#A9D9F7'],
  'partner-7': ['#4A4F54', '#C2C8CB'],
  'partner-7-line': ['#B4BABD', '#4E565B'],
  'partner-7-text': ['#42474C', '#CDD2D4'],
  'partner-8': ['#6E6700', '#E6DB5A'],
  'partner-8-line': ['#D8D17A', '#575100'],
  'partner-8-text': ['#5F5900', '#EAE07A'],
} as const satisfies Record<string, TokenPair>;

const all = { ...pairs, ...partnerPairs };

export type ColourToken = keyof typeof all;

export const colourTokens = Object.keys(all) as ColourToken[];

/** The value of a token in a theme, as written in CSS. */
export function colourOf(token: ColourToken, theme: Theme): string {
  return all[token][theme === 'light' ? 0 : 1];
}

/** CSS custom properties of one theme: `{ '--shell': '#F3EFE6', … }`. */
export function customProperties(theme: Theme): Record<string, string> {
  return Object.fromEntries(colourTokens.map((token) => [`--${token}`, colourOf(token, theme)]));
}

/** Sizes of type in px with their line heights. Nothing smaller than 13 but the ticks of a chart. */
export const typeScale = {
  tick: [12, 16],
  xs: [13, 18],
  sm: [13, 18],
  base: [15, 22],
  lg: [17, 24],
  xl: [20, 26],
  '2xl': [26, 32],
  '3xl': [38, 42],
} as const;
