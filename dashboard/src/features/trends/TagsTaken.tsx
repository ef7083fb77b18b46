import { Box, Table, TableBody, TableCell, TableHead, TableRow } from '@mui/material';
import { type TakeInReport } from '@tailrace/shared/contracts/trends';
import { number } from '@tailrace/shared/messages/figures';
import { Instant } from '../../ui/Instant';

/** What was taken of each tag, and which tags stayed in the file. */
export function TagsTaken({ report }: { report: TakeInReport }) {
  return (
    <>
      {report.tags.length === 0 ? (
        <Box sx={{ color: 'text.secondary' }}>No tag of this file is bound to a valve.</Box>
      ) : (
        <Box sx={{ overflowX: 'auto' }}>
          <Table aria-label="Taken, by tag">
            <TableHead>
              <TableRow>
                <TableCell>Historian tag</TableCell>
                <TableCell align="right">Samples</TableCell>
                <TableCell align="right">Of them bad</TableCell>
                <TableCell>From</TableCell>
                <TableCell>To</TableCell>
              </TableRow>
            </TableHead>
            <TableBody>
              {report.tags.map((tag) => (
                <TableRow key={tag.historianTag}>
                  <TableCell>{tag.historianTag}</TableCell>
                  <TableCell align="right">{number(tag.taken)}</TableCell>
                  <TableCell align="right">{number(tag.bad)}</TableCell>
                  <TableCell>
                    <Instant at={tag.from} />
                  </TableCell>
                  <TableCell>
                    <Instant at={tag.to} />
                  </TableCell>
                </TableRow>
              ))}
            </TableBody>
          </Table>
        </Box>
      )}
      {report.leftInFile.length > 0 && (
        <Box sx={{ color: 'text.secondary', mt: 1, maxWidth: '90ch', overflowWrap: 'anywhere' }}>
          {`Left in the file, bound to no valve: ${report.leftInFile.join(', ')}.`}
        </Box>
      )}
    </>
  );
}
