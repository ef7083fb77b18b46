import { type DropSource } from '../assessment.js';
import { type DataSheet, type DesignCase } from '../data-sheet.js';
import { lineModel, type LineModel, pressureDropAt } from '../flow-coefficient/line-model.js';
import { type CutWindows } from './cut-windows.js';

/** Pressures for each window, and where they came from. */
export interface ModelledPressures {
  readonly source: DropSource;
  readonly line: LineModel | null;
  /** kPa(a) */
  readonly upstreamPressure: Float64Array;
  /** kPa; NaN where the model does not speak for the flow */
  readonly drop: Float64Array;
}

/** A pressure as a constant plus a square of flow, from the design cases. */
interface SquareLaw {
  /** kPa at no flow */
  readonly at0: number;
  /** kPa per squared unit of flow */
  readonly perSquare: number;
}

/**
 * Pressures of windows whose own are not (both) recorded: the missing end as a constant plus a square of flow
 * where one end is measured, else the drop of the sheet's line model.
 *
 * Windows in which less than a fifth of the shut drop is left carry no drop: there an error of the line's
 * resistance would bend the curve.
 *
 * @returns null where the design cases do not fix a model
 * Source: methods.md §2.5
 */
export function modelledPressures(cut: CutWindows, sheet: DataSheet): ModelledPressures | null {
  if (sheet.fluid === null) return null;
  const model = lineModel(sheet);
  const line = 'a' in model ? model : null;
  const upstream = endPressureLaw(sheet, 'upstreamPressure');
  const downstream = endPressureLaw(sheet, 'downstreamPressure');
  const measuredUp = mostlyKnown(cut.upstreamPressure);
  const measuredDown = mostlyKnown(cut.downstreamPressure);

  if (measuredUp !== measuredDown && (measuredUp ? downstream : upstream) !== null) {
    const upstreamPressure = cut.flow.map((q, i) =>
      measuredUp ? (cut.upstreamPressure[i] as number) : lawAt(upstream as SquareLaw, q),
    );
    const drop = cut.flow.map((q, i) => {
      const other = measuredUp ? lawAt(downstream as SquareLaw, q) : (cut.downstreamPressure[i] as number);
      return usable((upstreamPressure[i] as number) - other, q, line);
    });
    return { source: 'modelled', line, upstreamPressure, drop };
  }
  if (line === null || upstream === null) return null;
  return {
    source: 'modelled',
    line,
    upstreamPressure: cut.flow.map((q) => lawAt(upstream, q)),
    drop: cut.flow.map((q) => usable(pressureDropAt(line, q), q, line)),
  };
}

/** Smallest share of the shut drop a modelled drop may be (§2.5). */
const leastShare = 0.2;

function usable(drop: number, flow: number, line: LineModel | null): number {
  if (!(drop > 0)) return NaN;
  if (line === null) return drop;
  return flow >= line.from && flow <= line.to && drop >= leastShare * line.a ? drop : NaN;
}

/** The cases of lowest and highest flow fix the line in q²; one case, or equal flows, give a constant. */
function endPressureLaw(sheet: DataSheet, end: 'upstreamPressure' | 'downstreamPressure'): SquareLaw | null {
  const cases = sheet.designCases
    .filter((c): c is DesignCase & Record<typeof end, number> => Number.isFinite(c[end]) && c.flow >= 0)
    .sort((one, other) => one.flow - other.flow);
  const first = cases[0];
  const last = cases[cases.length - 1];
  if (first === undefined || last === undefined) return null;
  const square = last.flow ** 2 - first.flow ** 2;
  if (!(square > 0)) return { at0: first[end], perSquare: 0 };
  const perSquare = (last[end] - first[end]) / square;
  return { at0: first[end] - perSquare * first.flow ** 2, perSquare };
}

function lawAt(law: SquareLaw, flow: number): number {
  return law.at0 + law.perSquare * flow * flow;
}

function mostlyKnown(column: Float64Array): boolean {
  let known = 0;
  for (const v of column) if (Number.isFinite(v)) known++;
  return column.length > 0 && known > 0.9 * column.length;
}
