import { type DataSheet, type DesignCase, type Fluid } from '../data-sheet.js';
import { basisOf, betweenBases } from './flow-basis.js';
import { fieldUnit } from './register-flow.js';
import { type FlowScale, type RegisterCase, type RegisterSheet, type UnitRemark } from './register-form.js';
import { isFlow } from './unit-of.js';
import { type Site, toCore } from './unit.js';
import { CvPerKv } from './unit-table.js';

interface Reading {
  readonly flow: FlowScale;
  readonly site: Site;
  readonly problems: UnitRemark[];
  readonly doubts: UnitRemark[];
}

/**
 * The register's data sheet in the core's units. Units that cannot be used are noted in `problems`, reservations in
 * `doubts`.
 */
export function registerSheet(sheet: RegisterSheet, reading: Reading): DataSheet {
  const perKv = sheet.coefficientUnit === 'Cv' ? CvPerKv : 1;
  const { scaled, basis } = reading.flow;
  return {
    characteristic: sheet.characteristic,
    ratedCoefficient: sheet.ratedCoefficient === null ? null : sheet.ratedCoefficient / perKv,
    rangeability: sheet.rangeability,
    table:
      sheet.table === null
        ? null
        : sheet.table
            .map(({ travel, coefficient }) => ({ travel, coefficient: coefficient / perKv }))
            .sort((one, other) => one.travel - other.travel),
    style: sheet.style,
    fluid: sheet.fluid === null ? null : plainFluid(sheet.fluid),
    FL: sheet.FL,
    xT: sheet.xT,
    Fd: sheet.Fd,
    valveSize: sheet.valveSize,
    pipeSize: sheet.pipeSize,
    trip: sheet.trip,
    criticality: sheet.criticality,
    designBand: sheet.designBand,
    flowBasis: basis,
    flowUnscaled: !scaled,
    flowSpan: flowSpan(sheet, reading),
    designCases: scaled ? sheet.designCases.map((c, i) => designCase(c, i, sheet, reading)) : [],
  };
}

/** Only the core's own fields, so that a stored sheet does not carry the form's extra ones. */
function plainFluid(fluid: Fluid): Fluid {
  return {
    phase: fluid.phase,
    density: fluid.density,
    vapourPressure: fluid.vapourPressure,
    criticalPressure: fluid.criticalPressure,
    viscosity: fluid.viscosity,
    molarMass: fluid.molarMass,
    specificHeatRatio: fluid.specificHeatRatio,
    compressibility: fluid.compressibility,
    temperature: fluid.temperature,
  };
}

function flowSpan(sheet: RegisterSheet, reading: Reading): number | null {
  const { scaled, unit } = reading.flow;
  if (!scaled) return unit === null ? sheet.flowSpan : 100;
  if (sheet.flowSpan === null) return null;
  if (sheet.flowSpanUnit === null) return unit === null ? sheet.flowSpan : toCore(sheet.flowSpan, unit);
  return flowIn(sheet.flowSpan, sheet.flowSpanUnit, '/dataSheet/flowSpanUnit', sheet.fluid, reading);
}

/** A flow of the sheet in the basis of the flow signal; NaN where its unit cannot be used, which is noted. */
function flowIn(
  value: number,
  text: string,
  pointer: string,
  fluid: Fluid | null,
  { flow, problems }: Reading,
): number {
  const unit = fieldUnit(text, pointer, isFlow, problems);
  const basis = unit === null ? null : basisOf(unit);
  if (unit === null || basis === null) return NaN;
  const factor = betweenBases(basis, flow.basis, fluid);
  if (factor === null) {
    problems.push({ pointer, code: 'flow-bases-not-connected', found: text });
    return NaN;
  }
  return toCore(value, unit) * factor;
}

function designCase(given: RegisterCase, index: number, sheet: RegisterSheet, reading: Reading): DesignCase {
  const pointer = `/dataSheet/designCases/${String(index)}`;
  return {
    name: given.name,
    flow: flowIn(given.flow, given.flowUnit, `${pointer}/flowUnit`, sheet.fluid, reading),
    ...pressuresOf(given, `${pointer}/pressureUnit`, reading),
  };
}

function pressuresOf(
  given: RegisterCase,
  pointer: string,
  { site, problems, doubts }: Reading,
): Pick<DesignCase, 'upstreamPressure' | 'downstreamPressure'> {
  const { upstreamPressure, downstreamPressure, pressureUnit } = given;
  const unknown = { upstreamPressure: null, downstreamPressure: null };
  if (upstreamPressure === null && downstreamPressure === null) return unknown;
  if (pressureUnit === null) {
    doubts.push({ pointer, code: 'unit-missing', found: null });
    return unknown;
  }
  const unit = fieldUnit(pressureUnit, pointer, (d) => d === 'pressure', problems);
  if (unit === null) return unknown;
  if (unit.doubtful) doubts.push({ pointer, code: 'gauge-or-absolute-not-stated', found: pressureUnit });
  const absolute = (value: number | null) => (value === null ? null : toCore(value, unit, site));
  return { upstreamPressure: absolute(upstreamPressure), downstreamPressure: absolute(downstreamPressure) };
}
