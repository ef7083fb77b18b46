import { Box } from '@mui/material';
import { type Action } from '@tailrace/shared/contracts/policy';
import { NavLink } from 'react-router-dom';
import { useMay } from '../../lib/session-query';

const areas: { to: string; word: string; action: Action }[] = [
  { to: '/', word: 'Ranking', action: 'ranking:read' },
  { to: '/valves', word: 'Valves', action: 'valves:read' },
  { to: '/trends', word: 'Trends', action: 'trends:read' },
  { to: '/runs', word: 'Runs', action: 'runs:read' },
];

/** What one can work on, as words. */
export function WorkAreas() {
  return (
    <Box
      component="nav"
      aria-label="Work areas"
      sx={{ display: 'flex', columnGap: 3, px: { xs: 2, md: 4 }, borderBottom: '1px solid var(--tr-line)' }}
    >
      {areas.map((area) => (
        <WorkArea key={area.to} {...area} />
      ))}
    </Box>
  );
}

function WorkArea({ to, word, action }: (typeof areas)[number]) {
  if (!useMay(action)) return null;
  return (
    <Box
      component={NavLink}
      to={to}
      end={to === '/'}
      sx={{
        py: 0.75,
        color: 'var(--tr-water)',
        fontWeight: 500,
        textDecoration: 'none',
        borderBottom: '3px solid transparent',
        '&:hover': { textDecoration: 'underline', textUnderlineOffset: '0.2em' },
        '&.active': { color: 'var(--tr-ink)', borderBottomColor: 'var(--tr-ink)' },
      }}
    >
      {word}
    </Box>
  );
}
