import { Box, Link } from '@mui/material';
import { Link as RouterLink } from 'react-router-dom';
import { ValveSearch } from '../../features/valves/ValveSearch';
import { useMe } from '../../lib/session-query';
import { PersonMenu } from './PersonMenu';
import { WorkAreas } from './WorkAreas';
import { Wordmark } from './Wordmark';

/** The thin band on top: whose plant, one search, the person; under it the work areas as words. */
export function TopBand() {
  const { site } = useMe();
  return (
    <Box component="header" className="screen-only">
      <Box
        sx={{
          display: 'flex',
          flexWrap: { xs: 'wrap', sm: 'nowrap' },
          alignItems: 'center',
          columnGap: 2,
          rowGap: 1,
          px: { xs: 2, md: 4 },
          py: 0.75,
          borderBottom: '1px solid var(--tr-line)',
        }}
      >
        <Link component={RouterLink} to="/" underline="none" aria-label="Tailrace, to the ranking">
          <Wordmark />
        </Link>
        <Box
          component="span"
          sx={{
            color: 'text.secondary',
            minWidth: 0,
            overflow: 'hidden',
            textOverflow: 'ellipsis',
            whiteSpace: 'nowrap',
          }}
        >
          {site.name}
        </Box>
        <Box sx={{ order: { xs: 3, sm: 0 }, flex: { xs: '1 0 100%', sm: '1 1 auto' }, display: 'flex' }}>
          <Box sx={{ width: '100%', maxWidth: { sm: 420 }, ml: 'auto' }}>
            <ValveSearch />
          </Box>
        </Box>
        <Box sx={{ ml: { xs: 'auto', sm: 0 } }}>
          <PersonMenu />
        </Box>
      </Box>
      <WorkAreas />
    </Box>
  );
}
