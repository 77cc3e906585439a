import { Eye, Lock } from "lucide-react";
import type { ReactNode } from "react";
import type { SharingPreview } from "#shared/contracts/sharing.ts";
import { ListedCopy } from "./listed-copy.tsx";

/** What would leave the shop beside what never does. */
export function PreviewColumns({ preview }: { preview: SharingPreview }) {
  return (
    <div className="grid gap-4 md:grid-cols-2">
      <Column icon={<Eye aria-hidden="true" size={18} />} title="What others see">
        <Seen preview={preview} />
      </Column>
      <Column icon={<Lock aria-hidden="true" size={18} />} title="What stays here">
        {preview.counts ? null : <p className="mb-2">Everything.</p>}
        <dl>
          {preview.staysHere.map(({ what, value }) => (
            <div key={what} className="grid grid-cols-[8.5rem_1fr] gap-3 border-t border-line py-1.5 text-sm">
              <dt className="text-muted">{what}</dt>
              <dd className="min-w-0 break-words whitespace-pre-wrap">{value}</dd>
            </div>
          ))}
        </dl>
      </Column>
    </div>
  );
}

function Column({ icon, title, children }: { icon: ReactNode; title: string; children: ReactNode }) {
  return (
    <section className="rounded border border-line bg-surface p-4">
      <h3 className="mb-2 flex items-center gap-2 font-bold">
        {icon}
        {title}
      </h3>
      {children}
    </section>
  );
}

function Seen({ preview }: { preview: SharingPreview }) {
  if (!preview.counts) return <p>Nothing.</p>;
  return (
    <>
      <p>
        Its setpoints are mixed into the figures of <b>{preview.groupLabel}</b>, and only where enough shops are in it.
        {preview.listed ? null : " No figure of it is shown by itself."}
      </p>
      {preview.listed ? (
        <>
          <p className="mt-2 mb-2">Besides, a rounded copy without a name:</p>
          <ListedCopy listed={preview.listed} />
        </>
      ) : null}
    </>
  );
}
