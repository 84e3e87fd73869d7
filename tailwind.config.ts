import type { Config } from 'tailwindcss';
import plugin from 'tailwindcss/plugin';
import { colourTokens, customProperties, typeScale } from './components/ui/tokens';

const rem = (px: number) => `${px / 16}rem`;

const colours: Record<string, string> = Object.fromEntries(
  colourTokens.map((token) => [token, `var(--${token})`]),
);

const config: Config = {
  darkMode: 'class',
  theme: {
    colors: { transparent: 'transparent', current: 'currentColor', inherit: 'inherit', ...colours },
    fontSize: Object.fromEntries(
      Object.entries(typeScale).map(([name, [size, line]]) => [name, [rem(size), rem(line)]]),
    ) as Record<string, [string, string]>,
    fontFamily: {
      sans: 'var(--font-atkinson-ext), var(--font-atkinson), system-ui, sans-serif',
      display: 'var(--font-bricolage-ext), var(--font-bricolage), system-ui, sans-serif',
      mono: 'var(--font-atkinson-mono-ext), var(--font-atkinson-mono), ui-monospace, monospace',
    },
    borderRadius: { none: '0', sm: '3px', md: '6px', DEFAULT: '6px', lg: '8px', xl: '12px', full: '9999px' },
    boxShadow: { none: 'none' },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ':root': { ...customProperties('light'), colorScheme: 'light' },
        '.dark': { ...customProperties('dark'), colorScheme: 'dark' },
      });
    }),
  ],
};

export default config;
