import { classNames } from "./class-names.ts";

const widths = ["w-full", "w-11/12", "w-4/5", "w-full", "w-2/3"];

/** Holds the place of what is loading. Appears only after a moment, so that quick answers do not flicker. */
export function Skeleton({ lines = 4, label = "Loading" }: { lines?: number; label?: string }) {
  const numbers = Array.from({ length: lines }, (_, at) => at);
  return (
    <div role="status" aria-label={label} className="skeleton space-y-3">
      {numbers.map((line) => (
        <div key={line} className={classNames("h-4 rounded bg-sunken", widths[line % widths.length])} />
      ))}
    </div>
  );
}
