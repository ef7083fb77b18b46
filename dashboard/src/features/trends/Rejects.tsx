import { Box, Table, TableBody, TableCell, TableHead, TableRow } from '@mui/material';
import { type TakeInReport } from '@tailrace/shared/contracts/trends';
import { number } from '@tailrace/shared/messages/figures';

/** What was not taken, by reason, with line numbers to look at in the file. */
export function Rejects({ rejects }: { rejects: TakeInReport['rejects'] }) {
  return (
    <Box sx={{ overflowX: 'auto' }}>
      <Table aria-label="Rejects by reason">
        <TableHead>
          <TableRow>
            <TableCell>Reason</TableCell>
            <TableCell align="right">How many</TableCell>
            <TableCell>First lines</TableCell>
            <TableCell>As it stands in the file</TableCell>
          </TableRow>
        </TableHead>
        <TableBody>
          {rejects.map((reject) => (
            <TableRow key={reject.reason}>
              <TableCell sx={{ fontWeight: 500 }}>{reject.reason}</TableCell>
              <TableCell align="right">{number(reject.count)}</TableCell>
              <TableCell>{reject.firstLines.join(', ')}</TableCell>
              <TableCell>
                <Box component="code" sx={{ overflowWrap: 'anywhere', fontSize: '0.875rem' }}>
                  {reject.example}
                </Box>
              </TableCell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </Box>
  );
}
