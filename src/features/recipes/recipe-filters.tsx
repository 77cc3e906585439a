import { ListFilter } from "lucide-react";
import { type ReactNode, useState } from "react";
import type { Machine } from "#shared/contracts/machines.ts";
import { recipeStates, sharingLevels } from "#shared/contracts/recipes.ts";
import { type Material, materialLabels, materials } from "#shared/materials/materials.ts";
import { unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { recipeStateLabels, sharingLevelLabels } from "../../lib/recipe-words.ts";
import { Button } from "../../ui/button.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { TextField } from "../../ui/text-field.tsx";
import { usePhone } from "../../ui/use-media-query.ts";
import { isFiltered, listDefaults, type RecipeListState, readLengthFilter, sortChoices } from "./recipe-list-state.ts";

export interface RecipeFiltersProps {
  state: RecipeListState;
  onChange: (patch: Partial<RecipeListState>) => void;
  machines: readonly Machine[];
  units: UnitSystem;
}

export function RecipeFilters({ state, onChange, machines, units }: RecipeFiltersProps) {
  const phone = usePhone();
  const [open, setOpen] = useState(false);
  const { q: _, ...filters } = state;
  const active = isFiltered({ ...filters, q: "" });
  const fields = <FilterFields {...{ state, onChange, machines, units }} />;

  return (
    <search className="mb-5 block space-y-4 print:hidden">
      <div className="flex items-end gap-2">
        <TextField
          label="Search"
          type="search"
          data-search=""
          placeholder="Grade, note, machine or metal"
          className="flex-1 md:max-w-md"
          value={state.q}
          onChange={(event) => onChange({ q: event.target.value })}
        />
        {phone ? null : <SortField state={state} onChange={onChange} />}
        {phone ? (
          <Button aria-expanded={open} onClick={() => setOpen(!open)}>
            <ListFilter aria-hidden="true" size={18} />
            Filter
          </Button>
        ) : null}
        {isFiltered(state) ? (
          <Button kind="quiet" onClick={() => onChange({ ...listDefaults, sort: state.sort, order: state.order })}>
            Clear
          </Button>
        ) : null}
      </div>
      {!phone || open || active ? fields : null}
      {phone && (open || active) ? <SortField state={state} onChange={onChange} /> : null}
    </search>
  );
}

/** Beside the column heads: a phone has none, and the last change has no column. */
function SortField({ state, onChange }: Pick<RecipeFiltersProps, "state" | "onChange">) {
  return (
    <SelectField
      label="Order"
      className="md:ml-auto md:w-52"
      choices={sortChoices}
      value={`${state.sort} ${state.order}`}
      onChange={(event) => {
        const [sort = "", order = ""] = event.target.value.split(" ");
        onChange({ sort, order });
      }}
    />
  );
}

const choicesOf = <Value extends string>(values: readonly Value[], labels: Record<Value, string>) =>
  values.map((value) => ({ value, label: labels[value] }));

function FilterFields({ state, onChange, machines, units }: RecipeFiltersProps): ReactNode {
  const material = (state.material || undefined) as Material | undefined; // an unknown one is read as none by the server call
  const select = (key: "material" | "machine" | "state" | "sharing") => ({
    value: state[key],
    onChange: (event: { target: { value: string } }) => onChange({ [key]: event.target.value }),
  });
  const length = (key: "thickness" | "nozzle") => ({
    value: state[key],
    error: readLengthFilter(state[key], `${key}Mm`, units, material).problem,
    onChange: (event: { target: { value: string } }) => onChange({ [key]: event.target.value }),
  });
  return (
    <div className="grid grid-cols-2 items-start gap-3 md:grid-cols-3 lg:grid-cols-6">
      <SelectField label="Metal" none="Any" choices={choicesOf(materials, materialLabels)} {...select("material")} />
      <TextField label="Thickness" placeholder="Any" unit={unitLabel("thickness", units)} {...length("thickness")} />
      <TextField label="Nozzle" placeholder="Any" unit={unitLabel("nozzle", units)} {...length("nozzle")} />
      <SelectField
        label="Machine"
        none="Any"
        choices={machines.map(({ id, name }) => ({ value: id, label: name }))}
        {...select("machine")}
      />
      <SelectField label="State" none="Any" choices={choicesOf(recipeStates, recipeStateLabels)} {...select("state")} />
      <SelectField
        label="Sharing"
        none="Any"
        choices={choicesOf(sharingLevels, sharingLevelLabels)}
        {...select("sharing")}
      />
    </div>
  );
}
