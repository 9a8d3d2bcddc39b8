import type { Logger } from 'pino'

/**
 * Work whose answer nobody waits for, such as a mail that must not show in the response time. Failures are logged;
 * `settled` lets shutdown and tests wait for what is still under way.
 */
export class Background {
  private readonly running = new Set<Promise<void>>()

  constructor(private readonly logger: Logger) {}

  run(name: string, work: () => Promise<void>): void {
    const task: Promise<void> = Promise.resolve()
      .then(work)
      .catch((error: unknown) => this.logger.error({ err: error, task: name }, 'background task failed'))
      .finally(() => this.running.delete(task))
    this.running.add(task)
  }

  async settled(): Promise<void> {
    while (this.running.size > 0) await Promise.all(this.running)
  }
}
