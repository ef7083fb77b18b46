import { Inject, Injectable, type OnModuleDestroy } from '@nestjs/common';
import { type Series, type SignalRole, type Span } from '@tailrace/shared/core/series';
import { defaultLimits } from '@tailrace/shared/core/limits';
import { Piscina } from 'piscina';
import { PeopleService } from '../people/people.service.js';
import { CONFIG, type Config } from '../platform/config.js';
import { workerFile } from '../platform/worker-file.js';
import { SampleStore } from '../trends/store/sample-store.js';
import { valveFormOf } from '../valves/present-valve.js';
import { ValveEntity } from '../valves/valve.entity.js';
import { type AssessOutcome, type AssessTask } from './assess-task.js';
import { assessedWindow } from './assessed-window.js';

export type ValveOutcomeOf = AssessOutcome | { readonly kind: 'no samples' };

/** Gathers a valve's signals from the sample store and has them assessed in a worker thread. */
@Injectable()
export class ValveAssessor implements OnModuleDestroy {
  private readonly pool: Piscina;
  readonly threads: number;

  constructor(
    private readonly samples: SampleStore,
    private readonly people: PeopleService,
    @Inject(CONFIG) config: Config,
  ) {
    this.threads = config.workers;
    this.pool = new Piscina({
      filename: workerFile('runs/assess.worker'),
      minThreads: 0,
      maxThreads: config.workers,
      idleTimeout: 30_000,
    });
  }

  async onModuleDestroy(): Promise<void> {
    await this.pool.destroy();
  }

  /** @param asked the window asked for; null: the default window of this valve */
  async assess(valve: ValveEntity, asked: Span | null): Promise<ValveOutcomeOf> {
    const site = await this.people.site();
    const window = asked ?? (await this.defaultWindow(valve, site.zone));
    if (!window) return { kind: 'no samples' };
    const span = { ...window, since: Math.min(window.from, window.to - defaultLimits.drift.days * 86_400) };
    const recorded: Partial<Record<SignalRole, Series>> = {};
    const seen = new Map<string, Series>();
    for (const { role, historianTag } of valve.signals ?? []) {
      const series =
        seen.get(historianTag) ?? (await this.samples.read(historianTag, { from: span.since, to: span.to }));
      // One tag may stand for two roles; columns are handed over, so the second needs its own.
      recorded[role] = seen.has(historianTag) ? copyOf(series) : series;
      seen.set(historianTag, series);
    }
    const task: AssessTask = {
      form: valveFormOf(valve),
      recorded,
      span,
      site: { barometricPressure: site.barometricPressure },
    };
    const columns = Object.values(recorded).flatMap(({ time, value, good }) => [
      time.buffer as ArrayBuffer,
      value.buffer as ArrayBuffer,
      good.buffer as ArrayBuffer,
    ]);
    return (await this.pool.run(task, { transferList: columns })) as AssessOutcome;
  }

  /** Newest sample of any of the valve's signals, s UTC; null without samples. */
  async newestSample(valve: ValveEntity): Promise<number | null> {
    return (await this.extent(valve))?.to ?? null;
  }

  private async defaultWindow(valve: ValveEntity, zone: string): Promise<Span | null> {
    const extent = await this.extent(valve);
    return extent && assessedWindow(extent.from, extent.to, zone, defaultLimits.findings.windowDays);
  }

  private async extent(valve: ValveEntity): Promise<Span | null> {
    let extent: Span | null = null;
    for (const tag of new Set((valve.signals ?? []).map(({ historianTag }) => historianTag))) {
      const own = await this.samples.extent(tag);
      if (!own) continue;
      extent = extent ? { from: Math.min(extent.from, own.from), to: Math.max(extent.to, own.to) } : own;
    }
    return extent;
  }
}

function copyOf({ time, value, good }: Series): Series {
  return { time: time.slice(), value: value.slice(), good: good.slice() };
}
