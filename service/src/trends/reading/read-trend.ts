import { type ColumnPlan, type TakeInReport } from '@tailrace/shared/contracts/trends';
import { type Series } from '@tailrace/shared/core/series';
import { cellValue, qualityIsGood } from './cell-value.js';
import { columnHeader } from './column-header.js';
import { type OpenText } from './open-text.js';
import { readRows, type Row } from './read-rows.js';
import { Refusal } from './refusal.js';
import { Rejects } from './rejects.js';
import { stampReader, type Stamp } from './stamp.js';
import { type Columns, findColumns } from './tag-columns.js';
import { TagSamples } from './tag-samples.js';
import { TimeOrder } from './time-order.js';

export interface ReadOptions {
  readonly path: string;
  readonly plan: ColumnPlan;
  /** is this tag to be taken? */
  readonly wanted: (tag: string) => boolean;
  /** samples of one tag, ascending; awaited before reading goes on */
  readonly onSamples: (tag: string, series: Series) => Promise<void> | void;
  readonly onProgress?: (progress: { share: number; rows: number }) => void;
  /** samples of a tag handed on at a time */
  readonly batch?: number;
}

/** rows without one readable time before the plan is called wrong */
const rowsToFindTime = 200;
/** s: a step back of up to two hours is a clock change read in the wrong zone (methods.md §1.1) */
const clockChange = 7_200;

/**
 * Reads a trend file by its plan, as a stream: samples go out tag by tag as they fill up.
 *
 * @returns what was taken and what was rejected, by reason
 * @throws Refusal where the file as a whole cannot be used
 */
export async function readTrend(options: ReadOptions): Promise<TakeInReport> {
  const reading = new Reading(options);
  let text: OpenText | null = null;
  for await (const batch of readRows(options.path, options.plan, (opened) => (text = opened))) {
    for (const row of batch) {
      if (row.line < options.plan.headerLine) continue;
      reading.row(row);
      if (reading.full.length > 0) await reading.handOn();
    }
    options.onProgress?.({ share: (text as OpenText | null)?.progress() ?? 0, rows: reading.rows });
  }
  return reading.finish();
}

class Reading {
  rows = 0;
  /** tags whose buffer is full: handed on before the next row */
  full: TagSamples[] = [];
  private columns: Columns | null = null;
  private readonly stamp: (text: string) => Stamp;
  /** the order of rows: in a wide file they share one time, whichever of their cells are empty */
  private readonly rowOrder = new TimeOrder();
  private readonly tags = new Map<string, TagSamples>();
  private readonly leftInFile = new Set<string>();
  private readonly rejects = new Rejects();
  private timesRead = 0;
  private firstOddTime: { line: number; cell: string } | null = null;

  constructor(private readonly options: ReadOptions) {
    this.stamp = stampReader(options.plan.time);
  }

  row(row: Row): void {
    if (!this.columns) {
      this.columns = this.header(row);
      return;
    }
    this.rows += 1;
    const { cells, line } = row;
    const timeCell = cells[this.columns.time];
    if (timeCell === undefined || cells.length > this.columns.header.length + 1) {
      this.rejects.add('wrong number of cells', line, cells.join(this.options.plan.delimiter));
      return;
    }
    const stamp = this.stamp(timeCell);
    if (stamp.kind !== 'time') return this.oddTime(stamp.kind, line, timeCell);
    this.timesRead += 1;
    if (this.columns.long) this.longRow(row, stamp, this.columns.long);
    else this.wideRow(row, stamp, this.columns);
  }

  async finish(): Promise<TakeInReport> {
    if (!this.columns) throw Refusal.because('noHeader', this.options.plan.headerLine);
    if (this.rows === 0) throw Refusal.because('headerOnly');
    if (this.timesRead === 0) this.refuseTimes();
    let samples = 0;
    let bad = 0;
    this.full = [...this.tags.values()];
    await this.handOn();
    for (const tag of this.tags.values()) {
      samples += tag.taken;
      bad += tag.bad;
    }
    if (samples > 0 && bad === samples) throw Refusal.because('allBad', samples);
    const instant = (seconds: number) =>
      Number.isFinite(seconds) ? new Date(seconds * 1000).toISOString() : null;
    return {
      rows: this.rows,
      samples,
      badSamples: bad,
      tags: [...this.tags.values()].map((tag) => ({
        historianTag: tag.tag,
        taken: tag.taken,
        bad: tag.bad,
        from: instant(tag.from),
        to: instant(tag.to),
      })),
      leftInFile: [...this.leftInFile],
      rejects: this.rejects.report(),
    };
  }

  private header({ cells }: Row): Columns {
    const columns = findColumns(cells, this.options.plan);
    if (!columns.long && columns.tags.length === 0) throw Refusal.because('notATable');
    for (const { tag } of columns.tags) this.samplesOf(tag);
    return columns;
  }

  private wideRow({ cells, line }: Row, stamp: Extract<Stamp, { kind: 'time' }>, columns: Columns) {
    const time = this.inOrder(this.rowOrder, stamp, line);
    for (const { tag, index } of columns.tags) {
      const cell = cells[index];
      // In a wide file an empty cell is no sample of this tag at this time: neither zero nor bad.
      if (cell === undefined || cell.trim() === '') continue;
      const samples = this.samplesOf(tag);
      if (samples)
        this.sample(samples, time, { cell, line, column: columns.header[index] ?? tag, good: true });
    }
  }

  private longRow(
    { cells, line }: Row,
    stamp: Extract<Stamp, { kind: 'time' }>,
    long: NonNullable<Columns['long']>,
  ) {
    const name = cells[long.tag]?.trim();
    const cell = cells[long.value];
    if (!name || cell === undefined) {
      this.rejects.add('wrong number of cells', line, cells.join(this.options.plan.delimiter));
      return;
    }
    const samples = this.samplesOf(columnHeader(name).tag);
    if (!samples) return;
    const quality = long.quality === null ? '' : (cells[long.quality] ?? '');
    const good = qualityIsGood(quality, this.options.plan.uncertainIsGood);
    const time = this.inOrder(samples.order, stamp, line);
    this.sample(samples, time, {
      cell,
      line,
      column: this.options.plan.long?.valueColumn ?? '',
      good,
    });
  }

  private sample(
    samples: TagSamples,
    time: number,
    { cell, line, column, good }: { cell: string; line: number; column: string; good: boolean },
  ): void {
    const read = cellValue(cell, this.options.plan.decimalMark);
    if (read.kind === 'other mark')
      throw Refusal.because('mixedDecimalMarks', line, column, cell.trim(), this.options.plan.decimalMark);
    if (read.kind === 'not a number') {
      this.rejects.add('value not a number', line, cell);
      return;
    }
    const value = read.kind === 'number' ? read.value : NaN;
    samples.add(time, value, good && read.kind === 'number');
    if (samples.full) this.full.push(samples);
  }

  private inOrder(order: TimeOrder, stamp: Extract<Stamp, { kind: 'time' }>, line: number): number {
    const { former } = order;
    const time = order.place(stamp);
    if ((time - former) * order.direction < 0) this.refuseOrder(former, time, line);
    return time;
  }

  private refuseOrder(former: number, here: number, line: number): never {
    const [from, to] = [former, here].map((seconds) => new Date(seconds * 1000).toISOString()) as [
      string,
      string,
    ];
    const { zone, format } = this.options.plan.time;
    const step = Math.abs(here - former);
    const likelyClock = step <= clockChange && (zone !== 'UTC' || step >= 1_800);
    if (!format.startsWith('epoch') && likelyClock)
      throw Refusal.because('clockChange', line, from, to, zone);
    throw Refusal.because('timeGoesBack', line, from, to);
  }

  private oddTime(kind: 'does not exist' | 'not understood', line: number, cell: string): void {
    this.firstOddTime ??= { line, cell };
    this.rejects.add(kind === 'does not exist' ? 'time does not exist' : 'time not understood', line, cell);
    if (this.timesRead === 0 && this.rows >= rowsToFindTime) this.refuseTimes();
  }

  private refuseTimes(): never {
    const { line, cell } = this.firstOddTime ?? { line: this.options.plan.headerLine + 1, cell: '' };
    throw Refusal.because('noTime', line, cell, this.options.plan.time.format);
  }

  /** The samples of a tag that is to be taken; null for one that stays in the file. */
  private samplesOf(tag: string): TagSamples | null {
    const known = this.tags.get(tag);
    if (known) return known;
    if (this.leftInFile.has(tag)) return null;
    if (!this.options.wanted(tag)) {
      this.leftInFile.add(tag);
      return null;
    }
    const order = this.options.plan.form === 'wide' ? this.rowOrder : new TimeOrder();
    const samples = new TagSamples(tag, this.options.batch ?? 16_384, order);
    this.tags.set(tag, samples);
    return samples;
  }

  /** Hands on the samples of every tag whose buffer is full, and waits until they are taken. */
  async handOn(): Promise<void> {
    const full = this.full;
    this.full = [];
    for (const samples of full) {
      const series = samples.take();
      if (series) await this.options.onSamples(samples.tag, series);
    }
  }
}
