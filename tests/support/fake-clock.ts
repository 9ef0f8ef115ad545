/** A clock that moves only when told to. */
export class FakeClock {
  #now: number;

  constructor(start = '2026-12-01T09:00:00.000Z') {
    this.#now = Date.parse(start);
  }

  readonly read = (): Date => new Date(this.#now);

  advance({ days = 0, hours = 0, minutes = 0, seconds = 0 }): void {
    this.#now += (((days * 24 + hours) * 60 + minutes) * 60 + seconds) * 1000;
  }
}
