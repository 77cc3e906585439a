export interface ProgressProps {
  label: string;
  /** 0 to 1; leave out while the end is unknown. */
  value?: number;
  /** What has been done so far, in words: "12 of 40 groups". */
  text?: string;
}

/** Long work under way. */
export function Progress({ label, value, text }: ProgressProps) {
  const percent = value === undefined ? undefined : Math.round(Math.min(1, Math.max(0, value)) * 100);
  return (
    <div>
      <div className="flex justify-between gap-4 text-sm">
        <span className="font-bold">{label}</span>
        <span className="figures text-muted">{text ?? (percent === undefined ? "Working…" : `${percent} %`)}</span>
      </div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        aria-valuetext={text}
        className="mt-1 h-2 overflow-hidden rounded border border-line-strong bg-surface"
      >
        <div
          className={percent === undefined ? "h-full w-1/3 animate-pulse bg-action" : "h-full bg-action"}
          style={percent === undefined ? undefined : { width: `${percent}%` }}
        />
      </div>
    </div>
  );
}
