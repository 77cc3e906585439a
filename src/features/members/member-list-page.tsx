import { useQuery } from "@tanstack/react-query";
import { useDeferredValue } from "react";
import type { Member } from "#shared/contracts/members.ts";
import { formatCount } from "#shared/units/format.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { Button } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { TextField } from "../../ui/text-field.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { MemberTable } from "./member-table.tsx";
import { type MemberFilters, membersQuery } from "./members.queries.ts";

const defaults = { search: "", state: "" };

/** For admins: who is in the network and how much each shares. What and which is nowhere here. */
export function MemberListPage() {
  const [filters, change] = useUrlState(defaults);
  // Typing stays quick: the list follows the last letter when there is time for it.
  const { data, error } = useQuery(membersQuery(useDeferredValue(filters)));
  if (error && !data) throw error;
  const filtered = filters.search !== "" || filters.state !== "";

  return (
    <>
      <PageHeader title="Members" facts="How much a shop shares is shown here, never what or which" />
      <Filters filters={filters} onChange={change} />
      {data ? (
        <Found members={data.items} filtered={filtered} onClear={() => change(defaults)} />
      ) : (
        <Skeleton lines={8} />
      )}
    </>
  );
}

const states = [
  { value: "active", label: "Active" },
  { value: "suspended", label: "Suspended" },
];

function Filters({ filters, onChange }: { filters: MemberFilters; onChange: (patch: Partial<MemberFilters>) => void }) {
  return (
    <search className="mb-5 grid gap-4 sm:grid-cols-[minmax(0,20rem)_12rem]">
      <TextField
        label="Search"
        type="search"
        placeholder="Name or place"
        data-search=""
        maxLength={100}
        value={filters.search}
        onChange={(event) => onChange({ search: event.target.value })}
      />
      <SelectField
        label="State"
        none="Any state"
        choices={states}
        value={filters.state}
        onChange={(event) => onChange({ state: event.target.value })}
      />
    </search>
  );
}

interface FoundProps {
  members: readonly Member[];
  filtered: boolean;
  onClear: () => void;
}

function Found({ members, filtered, onClear }: FoundProps) {
  if (members.length === 0 && filtered) {
    return (
      <EmptyState title="No member fits" action={<Button onClick={onClear}>Clear search and state</Button>}>
        The search looks at names and places.
      </EmptyState>
    );
  }
  if (members.length === 0) {
    return (
      <EmptyState title="No member yet">
        Shops become members when one of their <TextLink to="/applications">applications</TextLink> is admitted.
      </EmptyState>
    );
  }
  return (
    <>
      <p role="status" className="mb-2 text-sm text-muted">
        {formatCount(members.length)} {members.length === 1 ? "shop" : "shops"}
      </p>
      <MemberTable members={members} />
    </>
  );
}
