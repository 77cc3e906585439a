import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { type Column, Table } from "../../../src/ui/table.tsx";

interface Row {
  name: string;
  feed: number;
}

const rows: Row[] = [
  { name: "Copper 2 mm", feed: 1900 },
  { name: "Brass 3 mm", feed: 1400 },
];
const columns: Column<Row>[] = [
  { key: "name", header: "Recipe", cell: (row) => row.name, rowHeader: true, sortable: true },
  { key: "feed", header: "Feed", unit: "mm/min", cell: (row) => row.feed, numeric: true, sortable: true },
  { key: "more", header: "More", hideHeader: true, cell: () => "–" },
];
const byName = (row: Row) => row.name;

afterEach(() => vi.unstubAllGlobals());

function phone(matches: boolean): void {
  vi.stubGlobal("matchMedia", () => ({ matches, addEventListener() {}, removeEventListener() {} }));
}

test("says which column it is sorted by, and only of columns that can be sorted", () => {
  render(
    <Table
      caption="Recipes"
      columns={columns}
      rows={rows}
      rowKey={byName}
      sort={{ key: "feed", direction: "desc" }}
      onSort={() => {}}
    />,
  );
  const sorts = screen.getAllByRole("columnheader").map((header) => header.getAttribute("aria-sort"));
  expect(sorts).toEqual(["none", "descending", null]);
});

test("a header sorts upward first, then turns round", async () => {
  const onSort = vi.fn();
  const props = { caption: "Recipes", columns, rows, rowKey: byName, onSort };
  const { rerender } = render(<Table {...props} />);
  const feed = () => screen.getByRole("button", { name: /Feed/ });
  await userEvent.click(feed());
  expect(onSort).toHaveBeenLastCalledWith({ key: "feed", direction: "asc" });

  rerender(<Table {...props} sort={{ key: "feed", direction: "asc" }} />);
  feed().focus();
  await userEvent.keyboard("{Enter}");
  expect(onSort).toHaveBeenLastCalledWith({ key: "feed", direction: "desc" });
});

test("without a way to sort, headers are plain words", () => {
  render(<Table caption="Recipes" columns={columns} rows={rows} rowKey={byName} />);
  expect(screen.queryByRole("button")).toBeNull();
});

test("a hidden header still names its column", () => {
  render(<Table caption="Recipes" columns={columns} rows={rows} rowKey={byName} />);
  expect(screen.getByRole("columnheader", { name: "More" })).toBeTruthy();
});

test("rows are named by their header cell", () => {
  render(<Table caption="Recipes" columns={columns} rows={rows} rowKey={byName} />);
  const table = screen.getByRole("table", { name: "Recipes" });
  expect(
    within(table)
      .getAllByRole("rowheader")
      .map((cell) => cell.textContent),
  ).toEqual(["Copper 2 mm", "Brass 3 mm"]);
});

test("becomes a list of cards on a phone", () => {
  phone(true);
  render(
    <Table caption="Recipes" columns={columns} rows={rows} rowKey={byName} renderCard={(row) => <b>{row.feed}</b>} />,
  );
  expect(screen.queryByRole("table")).toBeNull();
  const cards = within(screen.getByRole("list", { name: "Recipes" })).getAllByRole("listitem");
  expect(cards.map((card) => card.textContent)).toEqual(["1900", "1400"]);
});

test("stays a table on a phone where no card is drawn", () => {
  phone(true);
  render(<Table caption="Recipes" columns={columns} rows={rows} rowKey={byName} />);
  expect(screen.getByRole("table")).toBeTruthy();
});
