import { Box } from '@mui/material';
import { area, curveBasis } from 'd3-shape';

/** Shares of time by travel of a valve nobody has: one long duty and a short one near the end. */
const shares = [
  0, 0, 1, 3, 8, 16, 26, 35, 41, 44, 43, 46, 50, 47, 38, 27, 18, 12, 9, 8, 10, 16, 22, 19, 9, 2, 0, 0,
];
const height = 60;

const ridge = area<number>(
  (_, i) => (i * 1000) / (shares.length - 1),
  height,
  (share) => height - share,
).curve(curveBasis);

/** A travel ridge along the foot of the page, for a page that has nothing else to show. */
export function WaterLine() {
  return (
    <Box
      aria-hidden
      className="screen-only"
      sx={{ position: 'fixed', inset: 'auto 0 0 0', height: { xs: '14vh', sm: '26vh' }, zIndex: -1 }}
    >
      <svg width="100%" height="100%" viewBox={`0 0 1000 ${height}`} preserveAspectRatio="none">
        <path d={ridge(shares) ?? ''} fill="var(--tr-band)" />
        <path d={`M0,${height}H1000`} stroke="var(--tr-line)" vectorEffect="non-scaling-stroke" />
      </svg>
    </Box>
  );
}
