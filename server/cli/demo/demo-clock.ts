/** A clock that the demo loader sets, so that the story's events bear the story's dates. */
export class DemoClock {
  private atMs = 0;

  /** @param moment - ISO 8601 */
  set(moment: string): void {
    this.atMs = Date.parse(moment);
  }

  /** Every look is a second later, so that events keep their order. */
  readonly now = (): Date => {
    this.atMs += 1000;
    return new Date(this.atMs);
  };
}
