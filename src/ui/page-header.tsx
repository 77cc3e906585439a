import { ChevronLeft } from "lucide-react";
import { type ReactNode, useEffect } from "react";
import { Link } from "react-router-dom";

export interface PageHeaderProps {
  title: string;
  /** One quiet line below: the facts that place this page. */
  facts?: ReactNode;
  back?: { to: string; label: string };
  actions?: ReactNode;
  /** For the browser's tab, where the heading alone would not tell. */
  documentTitle?: string;
}

export function PageHeader({ title, facts, back, actions, documentTitle }: PageHeaderProps) {
  useEffect(() => {
    document.title = `${documentTitle ?? title} · Tempermark`;
  }, [documentTitle, title]);

  return (
    <header className="mb-6 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        {back ? (
          <Link
            to={back.to}
            className="mb-1 -ml-1 inline-flex items-center gap-1 text-sm font-bold text-action hover:underline print:hidden"
          >
            <ChevronLeft aria-hidden="true" size={16} />
            {back.label}
          </Link>
        ) : null}
        <h1 className="text-xl font-black tracking-[-0.01em] break-words md:text-2xl">{title}</h1>
        {facts ? <p className="mt-1 text-muted">{facts}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-2 print:hidden">{actions}</div> : null}
    </header>
  );
}
