/** px: all ridges of the list share one axis, so they are all as wide */
export const ridgeWidth = 300;

/** The columns a row and the head above the rows share; findings go under them, then all under one another, as the page narrows. */
export const rowColumns = {
  display: 'grid',
  columnGap: 2,
  alignItems: 'start',
  gridTemplateColumns: {
    xs: '40px minmax(0, 1fr) auto',
    md: `2.25rem minmax(9rem, 1fr) ${ridgeWidth}px 44px 4.5rem`,
    lg: `2.25rem minmax(9rem, 13rem) ${ridgeWidth}px 44px minmax(0, 1fr) 4.5rem`,
  },
  gridTemplateAreas: {
    xs: '"rank valve attention" "glyph ridge ridge" "findings findings findings"',
    md: '"rank valve ridge glyph attention" ". findings findings findings findings"',
    lg: '"rank valve ridge glyph findings attention"',
  },
  rowGap: { xs: 0.5, lg: 0 },
} as const;
