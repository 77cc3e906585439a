import { useQuery } from "@tanstack/react-query";
import type { TestCut } from "#shared/contracts/test-cuts.ts";
import { materialLabels, materials } from "#shared/materials/materials.ts";
import { formatCount } from "#shared/units/format.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Button, ButtonLink } from "../../ui/button.tsx";
import { EmptyState } from "../../ui/empty-state.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { Pagination } from "../../ui/pagination.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { Table } from "../../ui/table.tsx";
import { TestCutCard, testCutColumns } from "./test-cut-columns.tsx";
import { testCutsQuery } from "./test-cuts.queries.ts";

const listDefaults = { material: "", acceptable: "" };

const acceptableChoices = [
  { value: "yes", label: "Acceptable" },
  { value: "no", label: "Not acceptable" },
];

/** What a hand-edited URL gets wrong is left out rather than refused. */
function listInput(state: typeof listDefaults & { cursor?: string }) {
  const acceptable = (["yes", "no"] as const).find((value) => value === state.acceptable);
  return { material: materials.find((value) => value === state.material), acceptable, cursor: state.cursor };
}

export function TestCutListPage() {
  const [state, change] = useUrlState(listDefaults);
  const { data, error } = useQuery(testCutsQuery(listInput(state)));
  if (error && !data) throw error;
  const filtered = state.material !== "" || state.acceptable !== "";
  const total = data?.total ?? 0;
  const nothingYet = data !== undefined && total === 0 && !filtered;

  return (
    <>
      <PageHeader
        title="Test cuts"
        facts="What was cut to try a recipe, newest first"
        actions={
          nothingYet ? null : (
            <ButtonLink to="/recipes" data-new="">
              Choose a recipe to log one
            </ButtonLink>
          )
        }
      />
      {nothingYet ? (
        <EmptyState title="No test cut yet" action={<ButtonLink to="/recipes">Choose a recipe</ButtonLink>}>
          Open the recipe you cut with and log what you see: through or not, dross, top edge, good enough or not.
        </EmptyState>
      ) : (
        <>
          <Filters state={state} onChange={change} filtered={filtered} />
          {data === undefined ? <Skeleton lines={8} /> : null}
          {data && total === 0 ? (
            <EmptyState title="Nothing fits these filters">Take one away, or clear them all.</EmptyState>
          ) : null}
          {data && total > 0 ? <TestCutTable cuts={data.items} next={data.next} total={total} /> : null}
        </>
      )}
    </>
  );
}

interface FiltersProps {
  state: typeof listDefaults;
  onChange: (patch: Partial<typeof listDefaults>) => void;
  filtered: boolean;
}

function Filters({ state, onChange, filtered }: FiltersProps) {
  return (
    <search className="mb-5 grid grid-cols-2 items-end gap-3 md:flex print:hidden">
      <SelectField
        label="Metal"
        none="Any"
        className="md:w-56"
        choices={materials.map((value) => ({ value, label: materialLabels[value] }))}
        value={state.material}
        onChange={(event) => onChange({ material: event.target.value })}
      />
      <SelectField
        label="Outcome"
        none="Any"
        className="md:w-56"
        choices={acceptableChoices}
        value={state.acceptable}
        onChange={(event) => onChange({ acceptable: event.target.value })}
      />
      {filtered ? (
        <Button kind="quiet" onClick={() => onChange(listDefaults)}>
          Clear
        </Button>
      ) : null}
    </search>
  );
}

function TestCutTable({ cuts, next, total }: { cuts: readonly TestCut[]; next: string | null; total: number }) {
  const { units } = useSession();
  return (
    <>
      <Table
        caption="The shop's test cuts"
        columns={testCutColumns(units)}
        rows={cuts}
        rowKey={(cut) => cut.id}
        renderCard={(cut) => <TestCutCard cut={cut} units={units} />}
      />
      <Pagination next={next} summary={`${formatCount(cuts.length)} of ${formatCount(total)} test cuts`} />
    </>
  );
}
