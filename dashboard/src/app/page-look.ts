import { type SchemeName, inksOf } from './theme';

const properties = (scheme: SchemeName): Record<string, string> =>
  Object.fromEntries(Object.entries(inksOf[scheme]).map(([name, value]) => [`--tr-${name}`, value]));

/** What holds for the whole page: the inks as custom properties, figures of one width, focus, print. */
export const pageLook = {
  ':root': properties('light'),
  '[data-scheme="dark"]': properties('dark'),
  body: {
    backgroundColor: 'var(--tr-paper)',
    color: 'var(--tr-ink)',
    fontVariantNumeric: 'tabular-nums',
    WebkitFontSmoothing: 'antialiased',
    overflowY: 'scroll',
  },
  ':focus-visible': { outline: '2px solid var(--tr-water)', outlineOffset: 2 },
  'a:not([class])': { color: 'var(--tr-water)', textUnderlineOffset: '0.15em' },
  '@media print': {
    '@page': { margin: '12mm' },
    // the library's own properties too, said stronger than it does: a dark page would else print in pale grey
    ':root:root': {
      ...properties('light'),
      '--tr-paper': '#FFFFFF',
      '--mui-palette-text-primary': inksOf.light.ink,
      '--mui-palette-text-secondary': inksOf.light['ink-2'],
      '--mui-palette-primary-main': inksOf.light.water,
      '--mui-palette-background-default': '#FFFFFF',
      colorScheme: 'light',
    },
    body: { fontSize: '10pt', overflowY: 'visible' },
    '.screen-only': { display: 'none !important' },
  },
  '@media (prefers-reduced-motion: reduce)': {
    '*, *::before, *::after': {
      animationDuration: '0.01ms !important',
      animationIterationCount: '1 !important',
      transitionDuration: '0.01ms !important',
    },
  },
} as const;
