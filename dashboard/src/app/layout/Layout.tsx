import { Box, LinearProgress, Link } from '@mui/material';
import { Outlet, ScrollRestoration, useNavigation } from 'react-router-dom';
import { TopBand } from './TopBand';

/** One sheet under a thin band. */
export function Layout() {
  const { state } = useNavigation();
  return (
    <>
      <Link
        href="#sheet"
        sx={{
          position: 'absolute',
          left: 8,
          top: -60,
          zIndex: 2000,
          p: 1,
          bgcolor: 'var(--tr-sheet)',
          '&:focus': { top: 8 },
        }}
      >
        Skip to the sheet
      </Link>
      <TopBand />
      <Box sx={{ height: 3, mb: -0.375 }} aria-hidden>
        {state === 'loading' && <LinearProgress sx={{ height: 3 }} />}
      </Box>
      <Box
        component="main"
        id="sheet"
        tabIndex={-1}
        sx={{
          maxWidth: 1480,
          px: { xs: 2, md: 4 },
          pt: 2,
          pb: 4,
          '&:focus': { outline: 'none' },
          '@media print': { p: 0, maxWidth: 'none' },
        }}
      >
        <Outlet />
      </Box>
      <ScrollRestoration />
    </>
  );
}
