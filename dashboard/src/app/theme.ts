import { createTheme, type PaletteOptions } from '@mui/material/styles';
import type {} from '@mui/x-data-grid/themeAugmentation';
import { componentLook } from './component-look';

/**
 * Paper and ink. Water is the only interactive colour; ochre and rust mark the abnormal and nothing else.
 * The dark values keep the same meaning and contrast AA on the dark paper.
 */
export const inksOf = {
  light: {
    ink: '#1E2A2F',
    'ink-2': '#5B686D',
    paper: '#F5F3EE',
    sheet: '#FDFCFA',
    water: '#0E6B80',
    ochre: '#B97F10',
    rust: '#A8431A',
    line: '#C9C5BA',
    band: '#E2DED3',
    edge: '#86837A',
  },
  dark: {
    ink: '#E6E3DA',
    'ink-2': '#98A3A6',
    paper: '#14191B',
    sheet: '#1B2124',
    water: '#5FB6CA',
    ochre: '#D9A441',
    rust: '#E0784A',
    line: '#3A4448',
    band: '#272F32',
    edge: '#7B878B',
  },
} as const;
export type SchemeName = keyof typeof inksOf;

function palette(scheme: SchemeName): PaletteOptions {
  const ink = inksOf[scheme];
  return {
    mode: scheme,
    primary: { main: ink.water, contrastText: scheme === 'light' ? '#FFFFFF' : ink.paper },
    secondary: { main: ink['ink-2'] },
    error: { main: ink.rust },
    warning: { main: ink.ochre },
    background: { default: ink.paper, paper: ink.sheet },
    text: { primary: ink.ink, secondary: ink['ink-2'] },
    divider: ink.line,
    DataGrid: { bg: ink.paper, headerBg: ink.paper, pinnedBg: ink.paper },
  };
}

const family = '"Roboto Condensed", "Arial Narrow", sans-serif';

/** The look of Tailrace (product.md §4): flat, square, dense, printable. */
export const theme = createTheme({
  cssVariables: { colorSchemeSelector: 'data-scheme' },
  colorSchemes: { light: { palette: palette('light') }, dark: { palette: palette('dark') } },
  shape: { borderRadius: 2 },
  spacing: 8,
  typography: {
    fontFamily: family,
    fontSize: 14,
    htmlFontSize: 16,
    fontWeightBold: 700,
    h1: { fontSize: '1.625rem', fontWeight: 700, lineHeight: 1.2, letterSpacing: '-0.005em' },
    h2: { fontSize: '1.125rem', fontWeight: 700, lineHeight: 1.3 },
    h3: { fontSize: '1rem', fontWeight: 700, lineHeight: 1.35 },
    body1: { fontSize: '1rem', lineHeight: 1.45 },
    body2: { fontSize: '0.875rem', lineHeight: 1.45 },
    button: { textTransform: 'none', fontWeight: 500, fontSize: '0.9375rem', lineHeight: 1.4 },
    caption: { fontSize: '0.8125rem', lineHeight: 1.4 },
  },
  components: componentLook,
});
