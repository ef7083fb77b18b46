import { Injectable } from '@nestjs/common';

/** The one place the service asks for the time, so that tests can move it. */
@Injectable()
export class Clock {
  /** ms UTC */
  now(): number {
    return Date.now();
  }
}
