/** px: all ridges of the list share one axis, so they are all as wide */
export const ridgeWidth = 300;

/** The columns a row and the head above the rows share; one under the other on a narrow page. */
export const rowColumns = {
  display: 'grid',
  columnGap: 2,
  alignItems: 'start',
  gridTemplateColumns: {
    xs: '40px minmax(0, 1fr) auto',
    md: `2.25rem minmax(9rem, 13rem) ${ridgeWidth}px 44px minmax(0, 1fr) 4.5rem`,
  },
  gridTemplateAreas: {
    xs: '"rank valve attention" "glyph ridge ridge" "findings findings findings"',
    md: '"rank valve ridge glyph findings attention"',
  },
  rowGap: { xs: 0.5, md: 0 },
} as const;
