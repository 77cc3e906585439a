import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { expect, test } from "vitest";
import { Tabs } from "../../../src/ui/tabs.tsx";

function Sample() {
  const [selected, setSelected] = useState("numbers");
  const tabs = ["numbers", "history", "sharing"].map((key) => ({ key, label: `The ${key}`, content: `${key} here` }));
  return <Tabs label="Parts of the recipe" tabs={tabs} selected={selected} onSelect={setSelected} />;
}

const selected = () => screen.getByRole("tab", { selected: true }).textContent;

test("the panel is named by the selected tab", async () => {
  render(<Sample />);
  expect(screen.getByRole("tablist", { name: "Parts of the recipe" })).toBeTruthy();
  expect(screen.getByRole("tabpanel", { name: "The numbers" }).textContent).toBe("numbers here");
  await userEvent.click(screen.getByRole("tab", { name: "The sharing" }));
  expect(screen.getByRole("tabpanel", { name: "The sharing" }).textContent).toBe("sharing here");
});

test("Tab stops at the selected tab alone; arrows, Home and End move and go round", async () => {
  render(<Sample />);
  await userEvent.tab();
  expect(document.activeElement?.textContent).toBe("The numbers");
  await userEvent.keyboard("{ArrowLeft}");
  expect(selected()).toBe("The sharing");
  expect(document.activeElement?.textContent).toBe("The sharing");
  await userEvent.keyboard("{ArrowRight}{ArrowRight}");
  expect(selected()).toBe("The history");
  await userEvent.keyboard("{End}");
  expect(selected()).toBe("The sharing");
  await userEvent.keyboard("{Home}");
  expect(selected()).toBe("The numbers");
  await userEvent.tab();
  expect(document.activeElement?.getAttribute("role")).toBe("tabpanel");
});
