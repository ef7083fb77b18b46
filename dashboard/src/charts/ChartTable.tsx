import { Table, TableBody, TableCell, TableContainer, TableHead, TableRow } from '@mui/material';
import { inks } from './inks';

export interface ChartTableContent {
  /** heads with their unit, the first naming the rows */
  columns: string[];
  rows: string[][];
}

/** The numbers of a chart, for those who would rather read or copy them. */
export function ChartTable({ title, content }: { title: string; content: ChartTableContent }) {
  return (
    <TableContainer
      tabIndex={0}
      role="region"
      aria-label={`${title}, table`}
      sx={{ maxHeight: 420, '@media print': { maxHeight: 'none' } }}
    >
      <Table size="small" stickyHeader aria-label={title} sx={{ width: 'auto' }}>
        <TableHead>
          <TableRow>
            {content.columns.map((column) => (
              <TableCell key={column} align="right" sx={{ bgcolor: inks.paper, fontWeight: 600 }}>
                {column}
              </TableCell>
            ))}
          </TableRow>
        </TableHead>
        <TableBody>
          {content.rows.map((row, i) => (
            <TableRow key={`${row[0] ?? ''} ${i}`}>
              {row.map((cell, column) => (
                <TableCell key={content.columns[column]} align="right">
                  {cell}
                </TableCell>
              ))}
            </TableRow>
          ))}
          {content.rows.length === 0 && (
            <TableRow>
              <TableCell colSpan={content.columns.length}>No points.</TableCell>
            </TableRow>
          )}
        </TableBody>
      </Table>
    </TableContainer>
  );
}
