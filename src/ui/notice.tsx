import { CircleAlert, CircleCheck, Info, TriangleAlert } from "lucide-react";
import type { ReactNode } from "react";
import { classNames } from "./class-names.ts";

export type NoticeKind = "info" | "sound" | "watch" | "stop";

const kinds = {
  info: { icon: Info, word: "Note", classes: "border-action bg-action-soft", tint: "text-action" },
  sound: { icon: CircleCheck, word: "Done", classes: "border-sound bg-sound-soft", tint: "text-sound" },
  watch: { icon: TriangleAlert, word: "Watch", classes: "border-watch bg-watch-soft", tint: "text-watch" },
  stop: { icon: CircleAlert, word: "Stop", classes: "border-stop bg-stop-soft", tint: "text-stop" },
};

export interface NoticeProps {
  kind?: NoticeKind;
  /** Says the kind in words too; "Watch" and the like where nothing better fits. */
  title?: string;
  /** Announced when it appears; leave out for what is on the page from the start. */
  live?: boolean;
  children?: ReactNode;
  className?: string;
}

export function Notice({ kind = "info", title, live, children, className }: NoticeProps) {
  const { icon: Icon, word, classes, tint } = kinds[kind];
  const role = live ? (kind === "stop" ? "alert" : "status") : undefined;
  return (
    <div role={role} className={classNames("flex gap-3 rounded border border-l-4 px-4 py-3", classes, className)}>
      <Icon aria-hidden="true" size={20} className={classNames("mt-0.5 shrink-0", tint)} />
      <div className="min-w-0 flex-1">
        <p className={classNames("font-bold", tint)}>{title ?? word}</p>
        {children}
      </div>
    </div>
  );
}

/** A state in one word, for cells and headings. */
export function StateWord({ kind, children }: { kind: NoticeKind; children: ReactNode }) {
  const { icon: Icon, tint } = kinds[kind];
  return (
    <span className={classNames("inline-flex items-center gap-1 font-bold whitespace-nowrap", tint)}>
      <Icon aria-hidden="true" size={16} />
      {children}
    </span>
  );
}
