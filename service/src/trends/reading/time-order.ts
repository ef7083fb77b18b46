import { type Stamp } from './stamp.js';

/**
 * The order of stamps that follow each other: the rows of a wide file, or the samples of one tag in a long one. It
 * settles which pass of a repeated hour is meant, and tells newest first from a time that goes back.
 */
export class TimeOrder {
  /** s UTC of the stamp before; NaN at the beginning */
  former = NaN;
  /** 1 for ascending, −1 for newest first, 0 while that is open */
  direction: -1 | 0 | 1 = 0;

  /** The stamp's instant, s UTC: of the two readings of a repeated hour, the one this order comes to first. */
  place({ first, second }: Extract<Stamp, { kind: 'time' }>): number {
    const { former, direction } = this;
    const follows = (time: number) =>
      Number.isNaN(former) || (direction < 0 ? time <= former : time >= former);
    const [nearer, farther] = direction < 0 ? [second, first] : [first, second];
    const time = Number.isNaN(second) ? first : follows(nearer) ? nearer : farther;
    if (direction === 0 && time !== former && !Number.isNaN(former)) this.direction = time > former ? 1 : -1;
    this.former = time;
    return time;
  }
}
