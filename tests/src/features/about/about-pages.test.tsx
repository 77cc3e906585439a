import { render, screen, within } from "@testing-library/react";
import { MemoryRouter } from "react-router-dom";
import { expect, test } from "vitest";
import { defaultDisclosureParameters } from "#shared/disclosure/parameters.ts";
import { materials, processGases } from "#shared/materials/materials.ts";
import { cautionsFor } from "#shared/safety/cautions.ts";
import { CautionsPage } from "../../../../src/features/about/cautions-page.tsx";
import { MethodPage } from "../../../../src/features/about/method-page.tsx";

const show = (page: React.ReactNode) => render(<MemoryRouter>{page}</MemoryRouter>);

test("the method shows every setting of the network with its value", () => {
  const { container } = show(<MethodPage />);
  for (const [name, value] of Object.entries(defaultDisclosureParameters)) {
    const row = container.querySelector<HTMLElement>(`[data-setting="${name}"]`)!;
    expect(within(row).getByText(String(value), { exact: true })).toBeTruthy();
    expect(row.querySelector("dd")!.textContent!.length).toBeGreaterThan(40);
  }
  expect(screen.getByText(/FCSM Statistical Policy Working Paper 22/)).toBeTruthy();
});

test("the cautions page holds every caution of every metal and gas, each once in its part", () => {
  const { container } = show(<CautionsPage />);
  const words = container.textContent!;
  const all = materials.flatMap((material) =>
    processGases.flatMap((gas) => cautionsFor({ material, gas, currentA: null })),
  );
  for (const { text } of all) expect(words.split(text)).toHaveLength(2);
});
