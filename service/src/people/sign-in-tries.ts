import { Injectable } from '@nestjs/common';
import { Clock } from '../platform/clock.js';

const most = 8;
const rest = 15 * 60_000;
const remembered = 10_000;

/** Wrong passwords by e-mail address: after eight within a quarter of an hour the address rests. */
@Injectable()
export class SignInTries {
  private readonly wrong = new Map<string, { count: number; until: number }>();

  constructor(private readonly clock: Clock) {}

  exhausted(email: string): boolean {
    const tries = this.wrong.get(email);
    return tries !== undefined && tries.until > this.clock.now() && tries.count >= most;
  }

  failed(email: string): void {
    const now = this.clock.now();
    const tries = this.wrong.get(email);
    const count = tries !== undefined && tries.until > now ? tries.count + 1 : 1;
    this.wrong.delete(email);
    this.wrong.set(email, { count, until: now + rest });
    // The oldest goes first, so that a flood of invented addresses cannot fill the memory.
    const [oldest] = this.wrong.keys();
    if (this.wrong.size > remembered && oldest !== undefined) this.wrong.delete(oldest);
  }

  succeeded(email: string): void {
    this.wrong.delete(email);
  }
}
