import { useEffect, useState } from "react";
import { Dialog } from "../ui/dialog.tsx";

const keys = [
  { key: "/", does: "Search this page" },
  { key: "n", does: "Add a new entry, on pages that list them" },
  { key: "?", does: "Show this list" },
  { key: "Tab", does: "Go to the next link, button or field" },
  { key: "Esc", does: "Close a dialog or menu" },
];

function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.closest("input, select, textarea, [contenteditable], dialog") !== null;
}

/** Single keys act only outside fields, so that nobody loses what they type. Pages mark `data-search` and `data-new`. */
export function KeyboardShortcuts() {
  const [listed, setListed] = useState(false);

  useEffect(() => {
    const acts: Record<string, () => boolean> = {
      "/": () => focusOn("[data-search]"),
      n: () => follow("[data-new]"),
      "?": () => {
        setListed(true);
        return true;
      },
    };
    const typed = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented || isTyping(event.target)) return;
      if (acts[event.key]?.()) event.preventDefault();
    };
    document.addEventListener("keydown", typed);
    return () => document.removeEventListener("keydown", typed);
  }, []);

  return (
    <Dialog open={listed} onClose={() => setListed(false)} title="Keys">
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-2">
        {keys.map(({ key, does }) => (
          <div key={key} className="contents">
            <dt>
              <kbd className="inline-block min-w-8 rounded border border-line-strong px-2 text-center font-sans text-sm font-bold">
                {key}
              </kbd>
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}

function focusOn(selector: string): boolean {
  const element = document.querySelector<HTMLElement>(selector);
  element?.focus();
  if (element instanceof HTMLInputElement) element.select();
  return element !== null;
}

function follow(selector: string): boolean {
  const element = document.querySelector<HTMLElement>(selector);
  element?.click();
  return element !== null;
}
