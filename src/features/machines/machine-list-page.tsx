import { useSuspenseQuery } from "@tanstack/react-query";
import { heightControlLabels, type Machine } from "#shared/contracts/machines.ts";
import { formatQuantity } from "#shared/units/format.ts";
import { machinesQuery } from "../../lib/machine-queries.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { type Column, Table } from "../../ui/table.tsx";
import { TextLink } from "../../ui/text-link.tsx";

export function MachineListPage() {
  const { units, shop } = useSession();
  const { items } = useSuspenseQuery(machinesQuery).data;
  const mayChange = shop?.role === "owner";
  const feed = (machine: Machine) => formatQuantity(machine.topFeedMmMin, "feed", units);

  const columns: Column<Machine>[] = [
    {
      key: "name",
      header: "Machine",
      rowHeader: true,
      cell: (m) => <TextLink to={`/machines/${m.id}`}>{m.name}</TextLink>,
    },
    { key: "current", header: "Up to", unit: "A", numeric: true, cell: (m) => m.powerSourceMaxCurrentA },
    { key: "feed", header: "Top feed", unit: feedUnit(units), numeric: true, cell: (m) => feed(m).text },
    { key: "height", header: "Height control", cell: (m) => heightControlLabels[m.heightControl] },
    { key: "recipes", header: "Recipes", numeric: true, cell: (m) => m.recipes },
  ];
  const add = mayChange ? (
    <ButtonLink to="/machines/new" kind="primary" data-new>
      Add a machine
    </ButtonLink>
  ) : null;

  return (
    <>
      <PageHeader title="Machines" facts="Table, power source, torch and height control as one" actions={add} />
      {items.length === 0 ? (
        <EmptyState title="No machine yet" action={add}>
          Describe the table you cut on. Recipes are kept for a machine, and a starting recipe respects its limits.
        </EmptyState>
      ) : (
        <Table
          caption="The shop's machines"
          columns={columns}
          rows={items}
          rowKey={(m) => m.id}
          renderCard={(m) => (
            <>
              <TextLink to={`/machines/${m.id}`}>{m.name}</TextLink>
              <p className="text-soft">
                Up to {m.powerSourceMaxCurrentA} A, {feed(m).text} {feed(m).unit}
              </p>
              <p className="text-sm text-muted">
                {heightControlLabels[m.heightControl]} · {m.recipes} recipes
              </p>
            </>
          )}
        />
      )}
    </>
  );
}

const feedUnit = (units: "metric" | "inch") => formatQuantity(1000, "feed", units).unit;
