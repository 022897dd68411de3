import { Clock } from '#server/config/clock';

/** Runs with the real clock until it is put forward. */
export class TestClock extends Clock {
  private aheadMs = 0;

  now(): Date {
    return new Date(Date.now() + this.aheadMs);
  }

  /** Puts the clock forward. */
  advance(milliseconds: number): void {
    this.aheadMs += milliseconds;
  }
}
