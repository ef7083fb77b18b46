import { type Loop } from './loop-settings.js';

/** A healthy loop: Kv 50 equal percentage in cold water, half its travel in use, every scan kept; any part may be replaced. */
export function aLoop(parts: Partial<Loop> = {}): Loop {
  return {
    seed: 1,
    start: 1_767_225_600,
    days: 7,
    valve: {
      kind: 'equal percentage',
      parameter: 40,
      ratedCoefficient: 50,
      ripple: 0,
      shift: 0,
      drift: 0,
      step: null,
      passing: 0,
      stick: { S: 0.2, J: 0 },
      play: 0,
      positionError: 0,
      FL: 0.9,
    },
    line: {
      dropShut: 400,
      lossShare: 0.5,
      destination: 300,
      density: 999.1,
      vapourPressure: 2,
      disturbance: 0.02,
    },
    duty: { kind: 'steps', low: 30, high: 75 },
    tuning: 1,
    swing: null,
    meterNoise: 0.003,
    shutdowns: [],
    frozen: [],
    historian: {
      scan: 60,
      tolerance: 0,
      longest: 3_600,
      roles: ['demand', 'position', 'flow', 'setPoint', 'upstreamPressure', 'downstreamPressure'],
    },
    ...parts,
  };
}
