import type { Application } from "#shared/contracts/applications.ts";
import { formatShortDate } from "#shared/units/dates.ts";
import { EmptyState } from "../../ui/empty-state.tsx";
import { StateWord } from "../../ui/notice.tsx";
import { type Column, Table } from "../../ui/table.tsx";

const decidedOn = ({ decidedAt }: Application) => (decidedAt ? formatShortDate(decidedAt) : "");

function Decision({ state }: Application) {
  return state === "admitted" ? (
    <StateWord kind="sound">Admitted</StateWord>
  ) : (
    <StateWord kind="watch">Declined</StateWord>
  );
}

const columns: Column<Application>[] = [
  { key: "shop", header: "Shop", rowHeader: true, cell: (a) => a.shopName },
  { key: "place", header: "Place", cell: (a) => a.place },
  { key: "person", header: "Who asked", cell: (a) => a.contactName },
  { key: "decision", header: "Decision", cell: (a) => <Decision {...a} /> },
  { key: "date", header: "Decided", numeric: true, cell: decidedOn },
  { key: "reason", header: "Reason", cell: (a) => <span className="break-words text-soft">{a.reason}</span> },
];

export function DecidedTable({ applications }: { applications: readonly Application[] }) {
  if (applications.length === 0) {
    return (
      <EmptyState title="Nothing decided yet">
        Admitted and declined shops stand here, with the reason given.
      </EmptyState>
    );
  }
  return (
    <Table
      caption="Decided applications, the latest first"
      columns={columns}
      rows={applications}
      rowKey={(a) => a.id}
      renderCard={(a) => (
        <>
          <div className="flex flex-wrap justify-between gap-x-4">
            <b className="break-words">{a.shopName}</b>
            <Decision {...a} />
          </div>
          <p className="text-soft">
            {a.place} · {decidedOn(a)}
          </p>
          {a.reason ? <p className="mt-1 break-words text-sm text-muted">{a.reason}</p> : null}
        </>
      )}
    />
  );
}
