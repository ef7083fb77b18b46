/**
 * The colours of a drawing, by what they mean. Their values are the theme's, as CSS custom properties, so that
 * one drawing serves the light page, the dark page and print.
 */
export const inks = {
  ink: 'var(--tr-ink)',
  quiet: 'var(--tr-ink-2)',
  paper: 'var(--tr-paper)',
  line: 'var(--tr-line)',
  band: 'var(--tr-band)',
  /** interactive only: the cursor */
  water: 'var(--tr-water)',
  ochre: 'var(--tr-ochre)',
  rust: 'var(--tr-rust)',
} as const;

/** Type of a drawing's words, on the svg element itself so that it goes along when the drawing is saved. */
export const lettering = {
  fontFamily: '"Roboto Condensed", "Arial Narrow", sans-serif',
  fontSize: 12,
  style: { fontVariantNumeric: 'tabular-nums' },
} as const;
