import type { ReactNode } from "react";

/** A place with nothing in it yet teaches the first step. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="rounded border border-dashed border-line-strong bg-surface px-6 py-8">
      <h2 className="text-lg font-bold">{title}</h2>
      {children ? <div className="mt-1 max-w-text text-soft">{children}</div> : null}
      {action ? <div className="mt-4 flex flex-wrap gap-2">{action}</div> : null}
    </div>
  );
}
