import { Box, Button, Divider, Menu, MenuItem } from '@mui/material';
import { useColorScheme } from '@mui/material/styles';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { signOut } from '../../features/people/api';
import { useMe } from '../../lib/session-query';

const modes = [
  ['system', 'As the system'],
  ['light', 'Light'],
  ['dark', 'Dark'],
] as const;

/** Who is signed in, how the page looks to them, and the way out. */
export function PersonMenu() {
  const me = useMe();
  const navigate = useNavigate();
  const { mode, setMode } = useColorScheme();
  const [anchor, setAnchor] = useState<HTMLElement | null>(null);
  const close = () => setAnchor(null);

  const leave = async () => {
    close();
    await navigate('/sign-in');
    await signOut();
  };

  return (
    <>
      <Button
        aria-haspopup="menu"
        aria-expanded={anchor !== null}
        onClick={(event) => setAnchor(event.currentTarget)}
        sx={{ whiteSpace: 'nowrap' }}
      >
        {me.name}
      </Button>
      <Menu anchorEl={anchor} open={anchor !== null} onClose={close}>
        <Box
          component="li"
          role="none"
          sx={{ px: 2, py: 0.5, color: 'text.secondary', fontSize: '0.875rem' }}
        >
          {`${me.role}, ${me.allAreas ? 'all areas' : me.areas.map((area) => area.name).join(', ')}`}
        </Box>
        <MenuItem
          onClick={() => {
            close();
            void navigate('/me');
          }}
        >
          Your account
        </MenuItem>
        <Divider />
        {modes.map(([value, word]) => (
          <MenuItem
            key={value}
            role="menuitemradio"
            aria-checked={mode === value}
            selected={mode === value}
            onClick={() => setMode(value)}
          >
            {`${word}${mode === value ? ' ✓' : ''}`}
          </MenuItem>
        ))}
        <Divider />
        <MenuItem onClick={() => void leave()}>Sign out</MenuItem>
      </Menu>
    </>
  );
}
