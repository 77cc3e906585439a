type Stop = () => unknown;

/** Thrown through a start that was told to stop half-way; needs no message. */
export class StoppedError extends Error {}

/** What is running, in the order it was started; stopped in the opposite order, each once. */
export class Running {
  private readonly stops: Stop[] = [];
  private ending: Promise<void> | undefined;

  get isEnding(): boolean {
    return this.ending !== undefined;
  }

  /** @throws StoppedError when all is being stopped already; the late part is stopped too */
  async add(stop: Stop): Promise<void> {
    if (!this.ending) {
      this.stops.push(stop);
      return;
    }
    await stop();
    throw new StoppedError();
  }

  /** Goes on past a part that will not stop properly: the others must not be left behind. */
  stopAll(): Promise<void> {
    this.ending ??= (async () => {
      for (let stop = this.stops.pop(); stop; stop = this.stops.pop()) {
        try {
          await stop();
        } catch (error) {
          console.error(`while stopping: ${(error as Error).message}`);
        }
      }
    })();
    return this.ending;
  }
}
