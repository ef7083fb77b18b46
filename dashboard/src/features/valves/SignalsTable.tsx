import { Box, Table, TableBody, TableCell, TableHead, TableRow } from '@mui/material';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { roleWords } from '@tailrace/shared/messages/screens';
import { signalRoles } from '@tailrace/shared/core/series';

/** Which historian tag stands for what. */
export function SignalsTable({ signals }: { signals: Valve['signals'] }) {
  const bound = signalRoles.flatMap((role) => {
    const signal = signals[role];
    return signal ? [{ role, signal }] : [];
  });
  if (bound.length === 0)
    return (
      <Box sx={{ color: 'text.secondary' }}>
        No signal is bound. Bind historian tags when taking a trend file in.
      </Box>
    );
  const missing = signalRoles.filter((role) => !signals[role]).map((role) => roleWords[role]);
  return (
    <Box sx={{ overflowX: 'auto' }}>
      <Table>
        <TableHead>
          <TableRow>
            <TableCell>Role</TableCell>
            <TableCell>Historian tag</TableCell>
            <TableCell>Unit</TableCell>
            <TableCell>Direction</TableCell>
          </TableRow>
        </TableHead>
        <TableBody>
          {bound.map(({ role, signal }) => (
            <TableRow key={role}>
              <TableCell>{roleWords[role]}</TableCell>
              <TableCell>{signal.tag}</TableCell>
              <TableCell>{signal.unit ?? '–'}</TableCell>
              <TableCell>{signal.reversed ? 'reversed: rises as the valve closes' : 'as it is'}</TableCell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
      {missing.length > 0 && (
        <Box sx={{ color: 'text.secondary', fontSize: '0.875rem', mt: 0.75 }}>
          {`Not bound: ${missing.join(', ')}.`}
        </Box>
      )}
    </Box>
  );
}
