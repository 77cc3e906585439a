/**
 * Refuses an input that breaks what a function promises to take.
 * @throws RangeError with `message`, worded "ewma needs …"
 */
export function requireThat(condition: boolean, message: string): asserts condition {
  if (!condition) throw new RangeError(message);
}
