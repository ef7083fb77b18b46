import { type Dimension } from './unit.js';

/** One line of the factor table: the way into the units of methods.md §0, and the spellings met in the trade. */
export interface UnitRow {
  readonly name: string;
  readonly dimension: Dimension;
  readonly factor: number;
  readonly offset?: number;
  /** beside the name; written as `unitOf` tidies them: lower case, no spaces, ³ as 3, no degree sign */
  readonly spellings: readonly string[];
}

const cubicFoot = 0.028316846592;
const gallon = 3.785411784e-3;
const imperialGallon = 4.54609e-3;
const barrel = 42 * gallon;
const pound = 0.45359237;
/** a gas volume at 15 °C, or at 60 °F, as a volume at 0 °C of the same pressure */
const from15C = 273.15 / 288.15;
const from60F = 273.15 / ((60 + 459.67) / 1.8);
/** Cv = 1.156 Kv as the standards round it (methods.md §0) */
export const CvPerKv = 1.156;

/**
 * The one factor table (methods.md §1.4). Exact definitions, except Cv, and water columns at their conventional density.
 * Pressures stand here without gauge or absolute: `unitOf` reads that from the text.
 */
export const unitTable: readonly UnitRow[] = [
  {
    name: 'm³/h',
    dimension: 'volume flow',
    factor: 1,
    spellings: ['m3/hr', 'm^3/h', 'cbm/h', 'm3h', 'm3.h-1', 'cmh'],
  },
  { name: 'm³/min', dimension: 'volume flow', factor: 60, spellings: ['m^3/min'] },
  { name: 'm³/s', dimension: 'volume flow', factor: 3600, spellings: ['m^3/s', 'm3/sec'] },
  { name: 'm³/d', dimension: 'volume flow', factor: 1 / 24, spellings: ['m^3/d', 'm3/day'] },
  { name: 'l/h', dimension: 'volume flow', factor: 1e-3, spellings: ['l/hr', 'lph', 'dm3/h'] },
  { name: 'l/min', dimension: 'volume flow', factor: 0.06, spellings: ['lpm', 'dm3/min'] },
  { name: 'l/s', dimension: 'volume flow', factor: 3.6, spellings: ['l/sec', 'dm3/s'] },
  {
    name: 'gpm',
    dimension: 'volume flow',
    factor: 60 * gallon,
    spellings: ['usgpm', 'gal/min', 'usgal/min', 'gpm(us)'],
  },
  { name: 'gph', dimension: 'volume flow', factor: gallon, spellings: ['usgph', 'gal/h', 'gal/hr'] },
  {
    name: 'igpm',
    dimension: 'volume flow',
    factor: 60 * imperialGallon,
    spellings: ['impgpm', 'gpm(imp)', 'gpm(uk)'],
  },
  { name: 'bbl/d', dimension: 'volume flow', factor: barrel / 24, spellings: ['bpd', 'bbl/day', 'b/d'] },
  { name: 'bbl/h', dimension: 'volume flow', factor: barrel, spellings: ['bph', 'bbl/hr'] },
  {
    name: 'ft³/h',
    dimension: 'volume flow',
    factor: cubicFoot,
    spellings: ['ft^3/h', 'ft3/hr', 'acfh', 'cfh'],
  },
  {
    name: 'ft³/min',
    dimension: 'volume flow',
    factor: 60 * cubicFoot,
    spellings: ['ft^3/min', 'acfm', 'cfm'],
  },

  { name: 'kg/h', dimension: 'mass flow', factor: 1, spellings: ['kg/hr', 'kgh', 'kgph'] },
  { name: 'kg/min', dimension: 'mass flow', factor: 60, spellings: [] },
  { name: 'kg/s', dimension: 'mass flow', factor: 3600, spellings: ['kg/sec'] },
  { name: 'g/s', dimension: 'mass flow', factor: 3.6, spellings: ['g/sec'] },
  {
    name: 't/h',
    dimension: 'mass flow',
    factor: 1000,
    spellings: ['t/hr', 'te/h', 'tph', 'tonne/h', 'mt/h'],
  },
  { name: 't/d', dimension: 'mass flow', factor: 1000 / 24, spellings: ['t/day', 'te/d', 'tpd', 'mt/d'] },
  {
    name: 'lb/h',
    dimension: 'mass flow',
    factor: pound,
    spellings: ['lb/hr', 'lbs/h', 'lbs/hr', 'pph', 'lbm/h', 'lbm/hr'],
  },
  { name: 'klb/h', dimension: 'mass flow', factor: 1000 * pound, spellings: ['klb/hr', 'kpph'] },
  { name: 'lb/min', dimension: 'mass flow', factor: 60 * pound, spellings: ['lbs/min', 'lbm/min'] },
  { name: 'lb/s', dimension: 'mass flow', factor: 3600 * pound, spellings: ['lb/sec', 'lbs/s'] },

  {
    name: 'Nm³/h',
    dimension: 'normal volume flow',
    factor: 1,
    spellings: ['nm3/hr', 'nm^3/h', 'ncmh', 'm3(n)/h', 'normalm3/h', 'm3/h(0c)', 'm3/h@0c'],
  },
  { name: 'Nm³/min', dimension: 'normal volume flow', factor: 60, spellings: ['nm^3/min'] },
  { name: 'Nm³/s', dimension: 'normal volume flow', factor: 3600, spellings: ['nm^3/s'] },
  { name: 'Nm³/d', dimension: 'normal volume flow', factor: 1 / 24, spellings: ['nm3/day'] },
  { name: 'kNm³/h', dimension: 'normal volume flow', factor: 1000, spellings: ['knm3/hr', 'kncmh'] },
  { name: 'Nl/min', dimension: 'normal volume flow', factor: 0.06, spellings: ['nlpm', 'ln/min'] },
  { name: 'Nl/h', dimension: 'normal volume flow', factor: 1e-3, spellings: ['nlph', 'ln/h'] },
  {
    name: 'Sm³/h',
    dimension: 'normal volume flow',
    factor: from15C,
    spellings: ['sm3/hr', 'sm^3/h', 'scmh', 'm3(s)/h', 'm3/h(15c)', 'm3/h@15c'],
  },
  { name: 'Sm³/d', dimension: 'normal volume flow', factor: from15C / 24, spellings: ['sm3/day', 'scmd'] },
  {
    name: 'kSm³/h',
    dimension: 'normal volume flow',
    factor: 1000 * from15C,
    spellings: ['ksm3/hr', 'kscmh'],
  },
  {
    name: 'MSm³/d',
    dimension: 'normal volume flow',
    factor: (1e6 / 24) * from15C,
    spellings: ['msm3/day', 'mmscmd'],
  },
  {
    name: 'scfh',
    dimension: 'normal volume flow',
    factor: cubicFoot * from60F,
    spellings: ['scf/h', 'scf/hr', 'sft3/h'],
  },
  {
    name: 'scfm',
    dimension: 'normal volume flow',
    factor: 60 * cubicFoot * from60F,
    spellings: ['scf/min', 'sft3/min'],
  },
  {
    name: 'kscfh',
    dimension: 'normal volume flow',
    factor: 1000 * cubicFoot * from60F,
    spellings: ['mscfh', 'kscf/h'],
  },
  {
    name: 'MSCFD',
    dimension: 'normal volume flow',
    factor: (1e3 / 24) * cubicFoot * from60F,
    spellings: ['mscf/d', 'kscfd'],
  },
  {
    name: 'MMSCFD',
    dimension: 'normal volume flow',
    factor: (1e6 / 24) * cubicFoot * from60F,
    spellings: ['mmscf/d'],
  },

  { name: 'Pa', dimension: 'pressure', factor: 1e-3, spellings: [] },
  { name: 'hPa', dimension: 'pressure', factor: 0.1, spellings: [] },
  { name: 'kPa', dimension: 'pressure', factor: 1, spellings: ['kn/m2'] },
  { name: 'MPa', dimension: 'pressure', factor: 1000, spellings: [] },
  { name: 'bar', dimension: 'pressure', factor: 100, spellings: [] },
  { name: 'mbar', dimension: 'pressure', factor: 0.1, spellings: [] },
  { name: 'psi', dimension: 'pressure', factor: 6.894757293168361, spellings: ['lb/in2', 'lbf/in2'] },
  {
    name: 'kgf/cm²',
    dimension: 'pressure',
    factor: 98.0665,
    spellings: ['kg/cm2', 'kp/cm2', 'at', 'kgf/cm^2', 'kg/cm^2'],
  },
  { name: 'mmH₂O', dimension: 'pressure', factor: 9.80665e-3, spellings: ['mmwc', 'mmws', 'mmw', 'mmaq'] },
  { name: 'mH₂O', dimension: 'pressure', factor: 9.80665, spellings: ['mwc', 'mws'] },
  { name: 'inH₂O', dimension: 'pressure', factor: 0.24908891, spellings: ['inwc', 'inw', '"h2o', '"wc'] },
  { name: 'mmHg', dimension: 'pressure', factor: 0.133322387415, spellings: [] },
  { name: 'inHg', dimension: 'pressure', factor: 3.386388640341, spellings: ['"hg'] },

  { name: 'K', dimension: 'temperature', factor: 1, spellings: ['kelvin', 'degk'] },
  {
    name: '°C',
    dimension: 'temperature',
    factor: 1,
    offset: 273.15,
    spellings: ['degc', 'celsius', 'deg.c', 'gradc'],
  },
  {
    name: '°F',
    dimension: 'temperature',
    factor: 5 / 9,
    offset: (459.67 * 5) / 9,
    spellings: ['degf', 'fahrenheit', 'deg.f'],
  },
  { name: '°R', dimension: 'temperature', factor: 5 / 9, spellings: ['degr', 'rankine'] },

  { name: 'kg/m³', dimension: 'density', factor: 1, spellings: ['kg/m^3', 'g/l', 'kgm3', 'kg.m-3'] },
  {
    name: 'g/cm³',
    dimension: 'density',
    factor: 1000,
    spellings: ['g/cm^3', 'g/ml', 'g/cc', 'kg/l', 'kg/dm3', 't/m3'],
  },
  {
    name: 'lb/ft³',
    dimension: 'density',
    factor: pound / cubicFoot,
    spellings: ['lb/ft^3', 'lbm/ft3', 'lbs/ft3', 'pcf'],
  },
  { name: 'SG', dimension: 'density', factor: 999.1, spellings: ['sp.gr.', 'spgr', 'rd'] },

  {
    name: '%',
    dimension: 'travel',
    factor: 1,
    spellings: [
      'percent',
      'pct',
      '%open',
      '%travel',
      '%op',
      '%opening',
      'percentopen',
      'pctopen',
      '%span',
      '%ofspan',
      '%range',
    ],
  },
  {
    name: 'fraction',
    dimension: 'travel',
    factor: 100,
    spellings: ['0-1', '0..1', '1', 'p.u.', 'pu', 'frac'],
  },
  {
    name: 'mA',
    dimension: 'travel',
    factor: 100 / 16,
    offset: -25,
    spellings: ['4-20ma', '4..20ma', 'ma(4-20)'],
  },

  { name: 'Kv', dimension: 'coefficient', factor: 1, spellings: ['kvs'] },
  { name: 'Cv', dimension: 'coefficient', factor: 1 / CvPerKv, spellings: [] },
];

/** Pressures whose name itself says that they are absolute. */
export const absoluteByName: readonly UnitRow[] = [
  { name: 'atm', dimension: 'pressure', factor: 101.325, spellings: [] },
  { name: 'ata', dimension: 'pressure', factor: 98.0665, spellings: [] },
  { name: 'Torr', dimension: 'pressure', factor: 101.325 / 760, spellings: [] },
];

/** Flows said to be normal or standard without a state: never guessed (methods.md §1.4). */
export const withoutState: readonly string[] = [
  'stdm3/h',
  'standardm3/h',
  'std.m3/h',
  'stdft3/h',
  'slpm',
  'sl/min',
  'slm',
  'sccm',
  'slph',
  'stdl/min',
];
