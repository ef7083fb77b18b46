/** px: all ridges of the list share one axis, so they are all as wide */
export const ridgeWidth = 300;

/** Findings under the rest: on a page of middle width, and on paper. */
const twoLines = {
  gridTemplateColumns: `2.25rem minmax(9rem, 1fr) ${ridgeWidth}px 44px 4.5rem`,
  gridTemplateAreas: '"rank valve ridge glyph attention" ". findings findings findings findings"',
};

/** The columns a row and the head above the rows share; all under one another on a narrow page. */
export const rowColumns = {
  display: 'grid',
  columnGap: 2,
  alignItems: 'start',
  gridTemplateColumns: {
    xs: '40px minmax(0, 1fr) auto',
    md: twoLines.gridTemplateColumns,
    lg: `2.25rem minmax(9rem, 13rem) ${ridgeWidth}px 44px minmax(0, 1fr) 4.5rem`,
  },
  gridTemplateAreas: {
    xs: '"rank valve attention" "glyph ridge ridge" "findings findings findings"',
    md: twoLines.gridTemplateAreas,
    lg: '"rank valve ridge glyph findings attention"',
  },
  rowGap: { xs: 0.5, lg: 0 },
  '@media print': twoLines,
} as const;
