import { Box } from '@mui/material';
import { type Valve } from '@tailrace/shared/contracts/valves';
import { Facts } from '../../ui/Facts';
import { Quantity } from '../../ui/Quantity';
import { DesignCases } from './DesignCases';

const failWords = { opens: 'opens', closes: 'closes', stays: 'stays where it is' } as const;

/** The left of the sheet: what the data sheet says. What it does not say is named once, not left blank. */
export function Specified({ valve }: { valve: Valve }) {
  const { dataSheet: sheet } = valve;
  const { fluid } = sheet;
  const facts = [
    ['Characteristic', sheet.characteristic],
    [
      'Rated coefficient',
      sheet.ratedCoefficient && <Entered value={sheet.ratedCoefficient} unit={sheet.coefficientUnit} />,
    ],
    ['Rangeability', sheet.rangeability && <Entered value={sheet.rangeability} unit="to 1" />],
    ['Working band', sheet.designBand && `${sheet.designBand.low} to ${sheet.designBand.high}\u00a0% travel`],
    ['Style', sheet.style],
    ['Valve size', sheet.valveSize && <Entered value={sheet.valveSize} unit="mm" />],
    ['Pipe size', sheet.pipeSize && <Entered value={sheet.pipeSize} unit="mm" />],
    ['FL', sheet.FL && <Entered value={sheet.FL} />],
    ['xT', sheet.xT && <Entered value={sheet.xT} />],
    ['Fluid', fluid && (fluid.name ? `${fluid.name} (${fluid.phase})` : fluid.phase)],
    ['Density', fluid?.density && <Entered value={fluid.density} unit="kg/m³" />],
    ['Vapour pressure', fluid?.vapourPressure && <Entered value={fluid.vapourPressure} unit="kPa(a)" />],
    ['Molar mass', fluid?.molarMass && <Entered value={fluid.molarMass} unit="kg/kmol" />],
    ['Flow span', sheet.flowSpan && <Entered value={sheet.flowSpan} unit={sheet.flowSpanUnit ?? ''} />],
    ['On failure', sheet.failAction && failWords[sheet.failAction]],
    ['Seat leakage class', sheet.leakageClass],
  ] as const;
  const missing = facts
    .slice(0, 3)
    .filter(([, fact]) => !fact)
    .map(([name]) => name.toLowerCase());
  return (
    <>
      <Facts facts={facts} />
      {missing.length > 0 && (
        <Box sx={{ color: 'text.secondary', fontSize: '0.875rem', mt: 1 }}>
          {`Not entered: ${missing.join(', ')}. What rests on it cannot be compared.`}
        </Box>
      )}
      <DesignCases cases={sheet.designCases} />
    </>
  );
}

function Entered({ value, unit }: { value: number; unit?: string }) {
  return <Quantity value={value} unit={unit} digits="as entered" />;
}
