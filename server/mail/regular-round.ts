import type { Logger } from 'pino';

export interface RegularRoundOptions {
  /** What the log calls it. */
  name: string;
  everyMs: number;
  /** Must be harmless to run twice: several servers may run it, and each runs it at its start. */
  run: () => Promise<void>;
  logger: Logger;
}

/** Runs the work now and again some time after each end; a failure is logged and the next round comes. */
export class RegularRound {
  private readonly options: RegularRoundOptions;
  private timer: NodeJS.Timeout | undefined;
  private running: Promise<void> = Promise.resolve();
  private stopped = false;

  constructor(options: RegularRoundOptions) {
    this.options = options;
  }

  start(): void {
    const { name, everyMs, run, logger } = this.options;
    const tick = () => {
      this.running = run().catch((error: unknown) =>
        logger.error({ err: error, round: name }, 'a regular round failed'),
      );
      void this.running.then(() => {
        if (!this.stopped) this.timer = setTimeout(tick, everyMs);
      });
    };
    tick();
  }

  /** Lets the round that runs come to its end. */
  async stop(): Promise<void> {
    this.stopped = true;
    clearTimeout(this.timer);
    await this.running;
  }
}
