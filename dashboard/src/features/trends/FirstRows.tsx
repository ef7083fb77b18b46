import { Box, Table, TableBody, TableCell, TableHead, TableRow } from '@mui/material';
import { type TrendLook } from '@tailrace/shared/contracts/trends';
import { Instant } from '../../ui/Instant';

const columnsShown = 8;

/** The first rows of a file, each with the instant it is understood as, or what is wrong with it. */
export function FirstRows({ look, rows = 8 }: { look: TrendLook; rows?: number }) {
  const { header, plan } = look;
  const more = header.length - columnsShown;
  return (
    <Box sx={{ overflowX: 'auto' }}>
      <Table aria-label="First rows as they are understood">
        <TableHead>
          <TableRow>
            <TableCell sx={{ minWidth: '11rem' }}>Understood as, site time</TableCell>
            {header.slice(0, columnsShown).map((name, i) => (
              <TableCell key={i} sx={{ whiteSpace: 'nowrap' }}>
                {name}
                {name === plan.time.column && ' (time)'}
              </TableCell>
            ))}
            {more > 0 && <TableCell>{`and ${more} more`}</TableCell>}
          </TableRow>
        </TableHead>
        <TableBody>
          {look.rows.slice(0, rows).map((cells, i) => {
            const time = look.times[i];
            return (
              <TableRow key={i}>
                <TableCell>
                  {time?.problem ? (
                    <Box sx={{ pl: 1, borderLeft: '3px solid var(--tr-rust)' }}>{time.problem}</Box>
                  ) : (
                    <Instant at={time?.instant ?? null} form="second" />
                  )}
                </TableCell>
                {cells.slice(0, columnsShown).map((cell, j) => (
                  <TableCell key={j} sx={{ whiteSpace: 'nowrap' }}>
                    {cell}
                  </TableCell>
                ))}
                {more > 0 && <TableCell>…</TableCell>}
              </TableRow>
            );
          })}
        </TableBody>
      </Table>
    </Box>
  );
}
