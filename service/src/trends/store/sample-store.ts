import { Injectable } from '@nestjs/common';
import { type Series, type Span } from '@tailrace/shared/core/series';
import { DataSource, EntityManager, In, LessThan, LessThanOrEqual, MoreThanOrEqual } from 'typeorm';
import { Transactions } from '../../platform/database/transactions.js';
import { decodeBlock, decodeInto } from './block-codec.js';
import { HistorianTagEntity } from './historian-tag.entity.js';
import { mergeSamples } from './merge-samples.js';
import { SampleBlockEntity, StagedBlockEntity } from './sample-block.entity.js';
import { blocksOf, type SampleBlock } from './sample-block.js';

const nothing: Series = { time: new Float64Array(0), value: new Float64Array(0), good: new Uint8Array(0) };
/** staged blocks brought in at a time */
const atATime = 64;

/**
 * Samples by historian tag, in encoded blocks. A file's blocks are staged while it is read and become visible all
 * together in one transaction; a kill at any moment leaves the former state.
 */
@Injectable()
export class SampleStore {
  constructor(
    private readonly database: DataSource,
    private readonly transactions: Transactions,
  ) {}

  /** Puts blocks of one tag aside for a file that is still being read. */
  async stage(fileId: string, tag: string, blocks: readonly SampleBlock[]): Promise<void> {
    await this.transactions.run(async (manager) => {
      const tagId = await this.tagId(manager, tag);
      await manager.insert(
        StagedBlockEntity,
        blocks.map((block) => ({ ...block, bytes: Buffer.from(block.bytes), fileId, tagId })),
      );
    });
  }

  /** Forgets what was staged for a file. */
  async discard(manager: EntityManager, fileId: string): Promise<void> {
    await manager.delete(StagedBlockEntity, { fileId });
  }

  /**
   * Makes a file's samples visible, within the caller's transaction. Where they overlap what is there, both are
   * merged and the newer value stands at equal times, so the same file again changes nothing.
   */
  async publish(manager: EntityManager, fileId: string): Promise<void> {
    for (;;) {
      const staged = await manager.find(StagedBlockEntity, {
        where: { fileId },
        order: { tagId: 'ASC', fromTime: 'ASC' },
        take: atATime,
      });
      if (staged.length === 0) return;
      for (const block of staged) await this.place(manager, block);
      await manager.delete(StagedBlockEntity, { id: In(staged.map(({ id }) => id)) });
    }
  }

  /** Samples of a tag in a span, ascending; empty for a tag never seen. */
  async read(tag: string, { from, to }: Span): Promise<Series> {
    const known = await this.database.getRepository(HistorianTagEntity).findOneBy({ name: tag });
    if (!known) return nothing;
    const blocks = await this.database.getRepository(SampleBlockEntity).find({
      where: { tagId: known.id, toTime: MoreThanOrEqual(from), fromTime: LessThan(to) },
      order: { fromTime: 'ASC' },
    });
    const total = blocks.reduce((sum, { count }) => sum + count, 0);
    const all: Series = {
      time: new Float64Array(total),
      value: new Float64Array(total),
      good: new Uint8Array(total),
    };
    let at = 0;
    for (const { bytes, count } of blocks) {
      decodeInto(bytes, count, all, at);
      at += count;
    }
    return within(all, from, to);
  }

  /** Times of a tag's oldest and newest sample, s UTC; null for a tag without samples. */
  async extent(tag: string): Promise<{ from: number; to: number } | null> {
    const found = await this.database
      .createQueryBuilder(SampleBlockEntity, 'block')
      .innerJoin(HistorianTagEntity, 'tag', 'tag.id = block.tagId')
      .select('MIN(block.fromTime)', 'from')
      .addSelect('MAX(block.toTime)', 'to')
      .where('tag.name = :tag', { tag })
      .getRawOne<{ from: number | null; to: number | null }>();
    return found && found.from !== null && found.to !== null ? { from: found.from, to: found.to } : null;
  }

  private async place(manager: EntityManager, staged: StagedBlockEntity): Promise<void> {
    const { tagId, fromTime, toTime } = staged;
    const overlapping = await manager.find(SampleBlockEntity, {
      where: { tagId, toTime: MoreThanOrEqual(fromTime), fromTime: LessThanOrEqual(toTime) },
      order: { fromTime: 'ASC' },
    });
    const same = overlapping.some(
      ({ fromTime: from, count, bytes }) =>
        from === fromTime &&
        count === staged.count &&
        Buffer.compare(Buffer.from(bytes), Buffer.from(staged.bytes)) === 0,
    );
    if (same) return;
    let blocks: readonly SampleBlock[] = [staged];
    if (overlapping.length > 0) {
      const older = overlapping
        .map(({ bytes, count }) => decodeBlock(bytes, count))
        .reduce((all, next) => mergeSamples(all, next), nothing);
      blocks = blocksOf(mergeSamples(older, decodeBlock(staged.bytes, staged.count)));
      await manager.delete(SampleBlockEntity, { id: In(overlapping.map(({ id }) => id)) });
    }
    await manager.insert(
      SampleBlockEntity,
      blocks.map(({ fromTime: from, toTime: to, count, goodCount, least, greatest, bytes }) => ({
        tagId,
        fromTime: from,
        toTime: to,
        count,
        goodCount,
        least,
        greatest,
        bytes: Buffer.from(bytes),
      })),
    );
  }

  private async tagId(manager: EntityManager, name: string): Promise<number> {
    const known = await manager.findOneBy(HistorianTagEntity, { name });
    if (known) return known.id;
    return (await manager.save(HistorianTagEntity, { name })).id;
  }
}

function within(series: Series, from: number, to: number): Series {
  const { time, value, good } = series;
  let start = 0;
  let end = time.length;
  while (start < end && (time[start] as number) < from) start += 1;
  while (end > start && (time[end - 1] as number) >= to) end -= 1;
  return start === 0 && end === time.length
    ? series
    : { time: time.slice(start, end), value: value.slice(start, end), good: good.slice(start, end) };
}
