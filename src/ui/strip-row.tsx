import type { ReactNode } from "react";

export interface StripRowProps {
  name: string;
  unit: string;
  /** The own value without its unit, or nothing. */
  figure?: string | undefined;
  /** A few words on where it stands. */
  note?: string | undefined;
  /** The strip. */
  children: ReactNode;
}

/** One metric: its name, its strip, the own value large at the right. On a phone the strip goes below the two. */
export function StripRow({ name, unit, figure, note, children }: StripRowProps) {
  return (
    <div
      data-keep-together=""
      className="grid grid-cols-[1fr_auto] gap-x-4 gap-y-2 border-t border-line py-4 last:border-b md:grid-cols-[9rem_1fr_9rem] md:gap-x-6"
    >
      <div>
        <h2 className="font-bold">{name}</h2>
        <p className="text-sm text-muted">{unit}</p>
      </div>
      <div className="col-span-2 row-start-2 min-w-0 md:col-span-1 md:row-start-auto md:pt-1.5">{children}</div>
      <div className="col-start-2 row-start-1 text-right md:col-start-3">
        {figure === undefined ? null : (
          <p className="figures text-xl font-black">
            {figure} <span className="text-sm font-normal text-muted">{unit}</span>
          </p>
        )}
        {note ? <p className="text-sm text-soft">{note}</p> : null}
      </div>
    </div>
  );
}
