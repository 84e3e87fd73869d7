import localFont from 'next/font/local';

// Each face ships as two files: Latin, loaded at once, and extended Latin (names such as Łucja or Şirin), loaded only
// when a page holds such a letter. The extended one stands first in the family, so that no fallback gets in between.

const display = localFont({
  src: '../fonts/bricolage-grotesque-latin-wdth-normal.woff2',
  variable: '--font-bricolage',
  weight: '200 800',
  display: 'swap',
  declarations: [{ prop: 'font-stretch', value: '75% 100%' }],
});

const displayExtended = localFont({
  src: '../fonts/bricolage-grotesque-latin-ext-wdth-normal.woff2',
  variable: '--font-bricolage-ext',
  weight: '200 800',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: 'font-stretch', value: '75% 100%' },
    { prop: 'unicode-range', value: 'U+0100-02BA, U+1E00-1E9F, U+1EF2-1EFF, U+20A0-20AB, U+20AD-20C0' },
  ],
});

const text = localFont({
  src: [
    {
      path: '../fonts/atkinson-hyperlegible-next-latin-wght-normal.woff2',
      weight: '200 800',
      style: 'normal',
    },
    {
      path: '../fonts/atkinson-hyperlegible-next-latin-wght-italic.woff2',
      weight: '200 800',
      style: 'italic',
    },
  ],
  variable: '--font-atkinson',
  display: 'swap',
});

const textExtended = localFont({
  src: [
    {
      path: '../fonts/atkinson-hyperlegible-next-latin-ext-wght-normal.woff2',
      weight: '200 800',
      style: 'normal',
    },
    {
      path: '../fonts/atkinson-hyperlegible-next-latin-ext-wght-italic.woff2',
      weight: '200 800',
      style: 'italic',
    },
  ],
  variable: '--font-atkinson-ext',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: 'unicode-range', value: 'U+0100-02BA, U+1E00-1E9F, U+1EF2-1EFF, U+20A0-20AB, U+20AD-20C0' },
  ],
});

const mono = localFont({
  src: '../fonts/atkinson-hyperlegible-mono-latin-wght-normal.woff2',
  variable: '--font-atkinson-mono',
  weight: '200 800',
  display: 'swap',
  adjustFontFallback: false,
});

const monoExtended = localFont({
  src: '../fonts/atkinson-hyperlegible-mono-latin-ext-wght-normal.woff2',
  variable: '--font-atkinson-mono-ext',
  weight: '200 800',
  display: 'swap',
  preload: false,
  adjustFontFallback: false,
  declarations: [
    { prop: 'unicode-range', value: 'U+0100-02BA, U+1E00-1E9F, U+1EF2-1EFF, U+20A0-20AB, U+20AD-20C0' },
  ],
});

/** Class names that give the page the variables of its faces; `tailwind.config.ts` builds the families from them. */
export const fontVariables = [display, displayExtended, text, textExtended, mono, monoExtended]
  .map((face) => face.variable)
  .join(' ');
