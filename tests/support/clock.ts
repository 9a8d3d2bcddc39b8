import type { Clock } from '#server/dependencies'

/** A clock that stands still until it is moved. */
export class TestClock implements Clock {
  constructor(private time = new Date('2026-03-02T08:00:00.000Z')) {}

  now(): Date {
    return new Date(this.time)
  }

  advance({ seconds = 0, minutes = 0, days = 0 }: { seconds?: number; minutes?: number; days?: number }): void {
    this.time = new Date(this.time.getTime() + ((days * 24 * 60 + minutes) * 60 + seconds) * 1000)
  }
}
