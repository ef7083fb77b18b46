import { type FlowBasis, type Fluid } from '../data-sheet.js';
import { molarVolume } from '../flow-coefficient/constants.js';
import { type Dimension, type Unit } from './unit.js';

/** The flow basis a unit counts in; null for a unit that is no flow. */
export function basisOf(unit: Unit): FlowBasis | null {
  const bases: Partial<Record<Dimension, FlowBasis>> = {
    'volume flow': 'volume',
    'mass flow': 'mass',
    'normal volume flow': 'normal volume',
  };
  return bases[unit.dimension] ?? null;
}

/**
 * What a flow in one basis has to be multiplied with to be in another.
 *
 * @returns null where the sheet's fluid does not tell: volume and mass need the density, mass and normal volume of a
 * gas its molar mass
 */
export function betweenBases(from: FlowBasis, to: FlowBasis, fluid: Fluid | null): number | null {
  if (from === to) return 1;
  const mass = massPer(from, fluid);
  const target = massPer(to, fluid);
  return mass === null || target === null ? null : mass / target;
}

function massPer(basis: FlowBasis, fluid: Fluid | null): number | null {
  if (basis === 'mass') return 1;
  if (fluid === null) return null;
  if (basis === 'volume') return fluid.density;
  return fluid.phase === 'gas' && fluid.molarMass !== null ? fluid.molarMass / molarVolume : null;
}
