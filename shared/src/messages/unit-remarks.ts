import { type UnitRemark, type UnitRemarkCode } from '../core/units/register-form.js';

const sentences: Record<UnitRemarkCode, (found: string) => string> = {
  'unit-unknown': (found) =>
    `“${found}” is not a unit known here. Write it in one of the usual spellings, such as m3/h, kg/h, bar(g), kPa(a) or °C.`,
  'state-not-named': (found) =>
    `“${found}” is a normal or standard flow that does not name its state. Use Nm3/h (0 °C), Sm3/h (15 °C), scfh or scfm (60 °F).`,
  'unit-of-another-quantity': (found) => `“${found}” is a unit of another quantity than this field holds.`,
  'flow-bases-not-connected': (found) =>
    `“${found}” counts the flow otherwise than the flow signal does, and the fluid’s data do not connect the two. Give the density (or the molar mass of a gas), or use one unit.`,
  'gauge-or-absolute-not-stated': (found) =>
    `“${found}” does not say gauge or absolute; it was read as absolute. Write bar(g) or bar(a).`,
  'unit-missing': () => 'No unit is given for this signal, so it was left out.',
  'flow-without-scale': () =>
    'The flow has no unit, so there is no flow coefficient; only the installed characteristic can be shown.',
};

/** A remark on a unit in the register's form: which field, and what to do about it. */
export function unitRemarkSentence({ pointer, code, found }: UnitRemark): string {
  return `${pointer}: ${sentences[code](found ?? '')}`;
}
