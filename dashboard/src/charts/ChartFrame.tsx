import { Box, Typography } from '@mui/material';
import { useId, useRef, useState, type ReactNode } from 'react';
import { ChartTable, type ChartTableContent } from './ChartTable';
import { ChartTool } from './ChartTool';
import { inks, lettering } from './inks';
import { saveDrawing } from './save-drawing';
import { useChartCursor, type CursorSeries } from './useChartCursor';
import { useElementSize } from './useElementSize';

export interface Drawing {
  marks: ReactNode;
  /** what the cursor reads out */
  series: CursorSeries[];
}

interface ChartFrameProps {
  title: string;
  /** units, basis and window: how the figures were obtained */
  note: string;
  /** the drawing in one sentence, for those who do not see it */
  summary: string;
  /** name of a saved file, without its ending */
  fileName: string;
  /** px for a width in px */
  height: (width: number) => number;
  draw: (size: { width: number; height: number }) => Drawing;
  table: ChartTableContent;
  /** further controls, such as the choice of axis */
  tools?: ReactNode;
}

/** What every chart has: its title and units, a cursor moved by keys, a table of the same numbers, saving. */
export function ChartFrame(props: ChartFrameProps) {
  const { title, note, summary, fileName, table, tools } = props;
  const titleId = useId();
  const svg = useRef<SVGSVGElement>(null);
  const [asTable, setAsTable] = useState(false);
  const [measured, width] = useElementSize<HTMLDivElement>(640);
  const height = props.height(width);
  const { marks, series } = props.draw({ width, height });
  const cursor = useChartCursor(series);
  const save = (form: 'svg' | 'png') => {
    if (svg.current) void saveDrawing(svg.current, fileName, form);
  };

  return (
    <Box component="figure" aria-labelledby={titleId} sx={{ m: 0, breakInside: 'avoid' }}>
      <Box sx={{ display: 'flex', flexWrap: 'wrap', columnGap: 2, alignItems: 'baseline' }}>
        <Typography id={titleId} component="figcaption" sx={{ fontWeight: 600 }}>
          {title}
        </Typography>
        <Typography variant="body2" sx={{ color: inks.quiet, flex: '1 1 20rem' }}>
          {note}
        </Typography>
        <Box sx={{ display: 'flex', mx: -1, '@media print': { display: 'none' } }}>
          {tools}
          <ChartTool pressed={asTable} onClick={() => setAsTable(!asTable)}>
            Table
          </ChartTool>
          {!asTable && <ChartTool onClick={() => save('svg')}>SVG</ChartTool>}
          {!asTable && <ChartTool onClick={() => save('png')}>PNG</ChartTool>}
        </Box>
      </Box>
      <div ref={measured}>
        {asTable ? (
          <ChartTable title={title} content={table} />
        ) : (
          <Box
            tabIndex={0}
            role="group"
            aria-label={`${title}: arrow keys read the points`}
            onKeyDown={cursor.onKeyDown}
            onBlur={cursor.onPointerLeave}
            sx={{ '&:focus-visible': { outline: `2px solid ${inks.water}` }, lineHeight: 0 }}
          >
            <svg
              ref={svg}
              role="img"
              aria-label={summary}
              viewBox={`0 0 ${width} ${height}`}
              width="100%"
              height={height}
              onPointerMove={cursor.onPointerMove}
              onPointerLeave={cursor.onPointerLeave}
              {...lettering}
            >
              {marks}
              {cursor.reading && (
                <g data-cursor fill="none" stroke={inks.water} pointerEvents="none">
                  <path d={`M${cursor.reading.x},0V${height}`} strokeDasharray="2 3" />
                  <circle cx={cursor.reading.x} cy={cursor.reading.y} r={6} strokeWidth={2} />
                </g>
              )}
            </svg>
          </Box>
        )}
      </div>
      <Typography
        variant="body2"
        role="status"
        aria-live="polite"
        sx={{ minHeight: '1.6em', color: inks.ink }}
      >
        {cursor.text}
      </Typography>
    </Box>
  );
}
