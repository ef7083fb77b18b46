import { Box, Table, TableBody, TableCell, TableHead, TableRow, Typography } from '@mui/material';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { unitText } from '../../lib/numbers';
import { Quantity } from '../../ui/Quantity';

/** The design cases of a data sheet: flow and pressures the valve was sized for. */
export function DesignCases({ cases }: { cases: Valve['dataSheet']['designCases'] }) {
  const first = cases[0];
  if (!first) return null;
  const flowUnits = new Set(cases.map((one) => one.flowUnit));
  const pressureUnits = new Set(cases.map((one) => one.pressureUnit));
  const inHead = flowUnits.size === 1 && pressureUnits.size === 1;
  const flowUnit = inHead ? `, ${unitText(first.flowUnit)}` : '';
  const pressureUnit = inHead && first.pressureUnit ? `, ${first.pressureUnit}` : '';
  return (
    <Box sx={{ mt: 2, overflowX: 'auto' }}>
      <Typography variant="h3">Design cases</Typography>
      <Table>
        <TableHead>
          <TableRow>
            <TableCell>Case</TableCell>
            <TableCell align="right">{`Flow${flowUnit}`}</TableCell>
            <TableCell align="right">{`P1${pressureUnit}`}</TableCell>
            <TableCell align="right" sx={{ pr: '0 !important' }}>{`P2${pressureUnit}`}</TableCell>
          </TableRow>
        </TableHead>
        <TableBody>
          {cases.map((one) => (
            <TableRow key={one.name}>
              <TableCell>{one.name}</TableCell>
              <TableCell align="right">
                <Quantity digits="as entered" value={one.flow} unit={inHead ? undefined : one.flowUnit} />
              </TableCell>
              <TableCell align="right">
                <Quantity
                  digits="as entered"
                  value={one.upstreamPressure}
                  unit={inHead ? undefined : (one.pressureUnit ?? '')}
                />
              </TableCell>
              <TableCell align="right" sx={{ pr: '0 !important' }}>
                <Quantity
                  digits="as entered"
                  value={one.downstreamPressure}
                  unit={inHead ? undefined : (one.pressureUnit ?? '')}
                />
              </TableCell>
            </TableRow>
          ))}
        </TableBody>
      </Table>
    </Box>
  );
}
