import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';
import { type SignalRole } from '../src/core/series.js';
import { simulate } from '../src/simulation/simulate.js';
import { areas, collections, site, valves } from './demo-plant.js';
import { loopOf, pointOf, registerForm } from './demo-valve.js';
import { type Column, longExport, wideExport } from './exports.js';
import { readme } from './readme.js';

/** Writes the demo plant: its register, its exports in four forms, and the page on what each valve shows. */

const folder = fileURLToPath(new URL('../../sample-trends/', import.meta.url));
mkdirSync(folder, { recursive: true });
for (const name of readdirSync(folder)) rmSync(`${folder}${name}`, { recursive: true });

const columnsByArea = new Map<string, Column[]>(areas.map(({ code }) => [code, []]));
const register: object[] = [];
for (const [i, valve] of valves.entries()) {
  const collection = collections[valve.area];
  if (!collection) throw new Error(`no collection for area ${valve.area}`);
  const loop = loopOf(valve, collection, 7100 + i);
  const { history, flowSpan } = simulate(loop);
  register.push(registerForm(valve, loop, flowSpan));
  for (const role of loop.historian.roles) {
    const series = history[role];
    if (series) columnsByArea.get(valve.area)?.push(columnOf(role, valve.tag, series, flowSpan));
  }
}

/** In the units the plant records in: bar(a) for pressures, and no more digits than a transmitter is worth. */
function columnOf(role: SignalRole, tag: string, series: Column['series'], flowSpan: number): Column {
  const point = pointOf(role, tag);
  if (role === 'upstreamPressure' || role === 'downstreamPressure')
    return { ...point, series: { ...series, value: series.value.map((v) => v / 100) }, decimals: 3 };
  const isFlow = role === 'flow' || role === 'setPoint';
  return { ...point, series, decimals: isFlow ? Math.max(0, 3 - Math.floor(Math.log10(flowSpan))) : 2 };
}

const iso = (t: number) => new Date(t * 1000).toISOString().replace('.000Z', 'Z');
const wallClock = new Intl.DateTimeFormat('en-GB', {
  timeZone: site.zone,
  hourCycle: 'h23',
  year: 'numeric',
  month: '2-digit',
  day: '2-digit',
  hour: '2-digit',
  minute: '2-digit',
  second: '2-digit',
});
const local = (t: number) => {
  const part = Object.fromEntries(wallClock.formatToParts(t * 1000).map(({ type, value }) => [type, value]));
  return `${part.day}.${part.month}.${part.year} ${part.hour}:${part.minute}:${part.second}`;
};

const columns = (area: string) => columnsByArea.get(area) ?? [];
const plainWide = { delimiter: ',', decimalMark: '.', stamp: iso, timeHeader: 'timestamp' } as const;
const files = [
  { file: 'washing-wide.csv.gz', area: 'WASH', content: gzip(wideExport(columns('WASH'), plainWide)) },
  { file: 'extraction-long.csv.gz', area: 'EXTR', content: gzip(longExport(columns('EXTR'), iso)) },
  {
    file: 'precipitation-local-time.csv',
    area: 'PREC',
    content: wideExport(columns('PREC'), {
      delimiter: ';',
      decimalMark: ',',
      stamp: local,
      timeHeader: 'Tid',
    }),
  },
  { file: 'utilities-long.csv.gz', area: 'UTIL', content: gzip(longExport(columns('UTIL'), iso)) },
];

/** Without the time of packing, so that the same plant gives the same bytes. */
function gzip(text: string): Buffer {
  const packed = gzipSync(text, { level: 9 });
  packed.fill(0, 4, 8);
  return packed;
}

const json = (value: unknown) => `${JSON.stringify(value, null, 2)}\n`;
for (const { file, content } of files) writeFileSync(`${folder}${file}`, content);
writeFileSync(`${folder}valves.json`, json(register));
writeFileSync(
  `${folder}plant.json`,
  json({ site, areas, files: files.map(({ file, area }) => ({ file, area })) }),
);
writeFileSync(`${folder}README.md`, readme(files.map(({ file }) => file)));
for (const form of register as { tag: string }[])
  if (['FV-1105', 'FV-2201'].includes(form.tag)) writeFileSync(`${folder}${form.tag}.valve.json`, json(form));
