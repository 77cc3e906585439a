/**
 * Runs `end` once on SIGTERM or SIGINT, or when the process that started this one is gone, then exits.
 * Signals may come twice (npm forwards them), so they are counted, not caught once.
 */
export function onStopSignal(end: () => Promise<void>): void {
  let ending = false;
  const stop = () => {
    if (ending) return;
    ending = true;
    end().then(
      () => process.exit(0),
      () => process.exit(1),
    );
  };
  process.on("SIGTERM", stop);
  process.on("SIGINT", stop);
  process.on("disconnect", stop);
}
