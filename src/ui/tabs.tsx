import { type KeyboardEvent, type ReactNode, useId, useRef } from "react";
import { classNames } from "./class-names.ts";

export interface Tab {
  key: string;
  label: string;
  content: ReactNode;
}

export interface TabsProps {
  /** What the tabs divide, for people who do not see them. */
  label: string;
  tabs: readonly Tab[];
  selected: string;
  onSelect: (key: string) => void;
}

const moves: Record<string, (at: number, count: number) => number> = {
  ArrowRight: (at, count) => (at + 1) % count,
  ArrowLeft: (at, count) => (at - 1 + count) % count,
  Home: () => 0,
  End: (_, count) => count - 1,
};

/** One stop for the Tab key; arrows, Home and End move between tabs. */
export function Tabs({ label, tabs, selected, onSelect }: TabsProps) {
  const id = useId();
  const list = useRef<HTMLDivElement>(null);
  const at = Math.max(
    0,
    tabs.findIndex((tab) => tab.key === selected),
  );
  const current = tabs[at];

  function move(event: KeyboardEvent) {
    const next = moves[event.key]?.(at, tabs.length);
    if (next === undefined) return;
    event.preventDefault();
    onSelect(tabs[next]!.key);
    list.current?.querySelectorAll<HTMLElement>('[role="tab"]')[next]?.focus();
  }

  return (
    <div>
      <div
        ref={list}
        role="tablist"
        aria-label={label}
        onKeyDown={move}
        className="flex overflow-x-auto border-b border-line"
      >
        {tabs.map((tab) => (
          <button
            key={tab.key}
            type="button"
            role="tab"
            id={`${id}-${tab.key}`}
            aria-selected={tab === current}
            aria-controls={`${id}-panel`}
            tabIndex={tab === current ? 0 : -1}
            onClick={() => onSelect(tab.key)}
            className={classNames(
              "min-h-touch shrink-0 border-b-[3px] px-4 font-bold -outline-offset-2",
              tab === current ? "border-action text-ink" : "border-transparent text-muted hover:text-ink",
            )}
          >
            {tab.label}
          </button>
        ))}
      </div>
      {/* In the order of the Tab key, because a panel without controls must still be reachable. */}
      <div role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${current?.key}`} tabIndex={0} className="pt-4">
        {current?.content}
      </div>
    </div>
  );
}
