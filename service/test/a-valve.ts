import { type ValveDraftInput } from '@tailrace/shared/contracts/valves';

let made = 0;

/** A water valve with position, flow and both pressures, ready to be sent to the register; what is given replaces what is here. */
export function aValve(given: Partial<ValveDraftInput> & { areaId: string }): ValveDraftInput {
  made += 1;
  const tag = given.tag ?? `FV-${1000 + made}`;
  return {
    tag,
    dataSheet: {
      service: 'Feed to column',
      characteristic: 'equal percentage',
      ratedCoefficient: 60,
      coefficientUnit: 'Kv',
      rangeability: 50,
      fluid: { phase: 'liquid', density: 1000, vapourPressure: 2.3, criticalPressure: 22_064 },
    },
    signals: {
      position: { tag: `${tag}.ZT`, unit: '%' },
      flow: { tag: `${tag}.FT`, unit: 'm3/h' },
      upstreamPressure: { tag: `${tag}.P1`, unit: 'kPa' },
      downstreamPressure: { tag: `${tag}.P2`, unit: 'kPa' },
    },
    ...given,
  };
}
