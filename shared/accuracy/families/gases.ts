import { type Gas } from '../../src/simulation/as-gas.js';

export const air: Gas = { molarMass: 28.96, temperature: 293, specificHeatRatio: 1.4, xT: 0.7 };
/** a valve whose gas chokes early */
export const earlyChokingAir: Gas = { ...air, xT: 0.2 };
