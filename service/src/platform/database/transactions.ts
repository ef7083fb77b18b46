import { Injectable } from '@nestjs/common';
import { DataSource, EntityManager } from 'typeorm';

/**
 * The one way to write. The SQLite driver has a single connection, and a transaction begun while another is open
 * becomes a savepoint inside it: rolled back with it, although its caller was told it stood. So they queue.
 */
@Injectable()
export class Transactions {
  private last: Promise<unknown> = Promise.resolve();

  constructor(private readonly database: DataSource) {}

  /** Runs the work in a transaction of its own, after those asked for before it. Never call it from inside one. */
  run<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    const turn = this.last.then(
      () => this.database.transaction(work),
      () => this.database.transaction(work),
    );
    this.last = turn;
    return turn;
  }
}
