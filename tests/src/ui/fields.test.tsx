import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { expect, test, vi } from "vitest";
import { ChoiceGroup } from "../../../src/ui/choice-group.tsx";
import { QuantityField, type QuantityReading } from "../../../src/ui/quantity-field.tsx";
import { SelectField } from "../../../src/ui/select-field.tsx";
import { TextAreaField, TextField } from "../../../src/ui/text-field.tsx";

/** The words a screen reader adds to a control. */
function descriptionOf(control: HTMLElement): string {
  const ids = control.getAttribute("aria-describedby")?.split(" ") ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent ?? `#${id} is missing`).join(" | ");
}

test("a text field is named by its label and says its unit", () => {
  render(<TextField label="Kerf width" unit="mm" hint="Measured at the bottom edge" />);
  const input = screen.getByRole("textbox", { name: "Kerf width" });
  expect(descriptionOf(input)).toBe("Measured at the bottom edge");
  expect(input.getAttribute("aria-invalid")).toBeNull();
  expect(screen.getByText("mm")).toBeTruthy();
});

test("an error is tied to its field, before the hint", () => {
  render(<TextField label="Cut height" hint="Torch to plate" error="Between 0.3 and 10 mm" />);
  const input = screen.getByRole("textbox", { name: "Cut height" });
  expect(input.getAttribute("aria-invalid")).toBe("true");
  expect(descriptionOf(input)).toBe("Between 0.3 and 10 mm | Torch to plate");
});

test("what may be left out says so in words", () => {
  render(<TextAreaField label="Note" optional />);
  expect(screen.getByRole("textbox", { name: "Note (optional)" })).toBeTruthy();
});

test("two fields with one label keep their own errors", () => {
  render(
    <>
      <TextField label="Feed rate" error="First" />
      <TextField label="Feed rate" error="Second" />
    </>,
  );
  expect(screen.getAllByRole("textbox").map(descriptionOf)).toEqual(["First", "Second"]);
});

const read = (text: string): QuantityReading =>
  text === "1/8 in" ? { ok: true, text: "3.18 mm" } : { ok: false, problem: `"${text}" has no unit known here` };

function Thickness({ error }: { error?: string }) {
  const [text, setText] = useState("");
  return <QuantityField label="Thickness" unit="mm" value={text} onValueChange={setText} read={read} error={error} />;
}

test("a quantity says what it understood while it is typed", async () => {
  render(<Thickness />);
  const input = screen.getByRole("textbox", { name: "Thickness" });
  expect(descriptionOf(input)).toBe("");
  await userEvent.type(input, "1/8");
  expect(descriptionOf(input)).toBe('"1/8" has no unit known here');
  await userEvent.type(input, " in");
  expect(descriptionOf(input)).toBe("= 3.18 mm");
});

test("a quantity refused on sending shows the refusal alone", async () => {
  render(<Thickness error="Between 0.4 and 50 mm" />);
  const input = screen.getByRole("textbox", { name: "Thickness" });
  await userEvent.type(input, "1/8 in");
  expect(descriptionOf(input)).toBe("Between 0.4 and 50 mm");
});

test("a select is named, begins with its empty choice and reports what is chosen", async () => {
  const changed = vi.fn();
  render(
    <SelectField
      label="Metal"
      none="Choose a metal"
      choices={[{ value: "copper", label: "Copper" }]}
      onChange={(event) => changed(event.target.value)}
      error="Choose one"
    />,
  );
  const select = screen.getByRole<HTMLSelectElement>("combobox", { name: "Metal" });
  expect(select.value).toBe("");
  expect(descriptionOf(select)).toBe("Choose one");
  await userEvent.selectOptions(select, "Copper");
  expect(changed).toHaveBeenCalledWith("copper");
});

const starts = [
  { value: "hf", label: "High frequency" },
  { value: "contact", label: "Contact", hint: "No high frequency" },
];

test("radio buttons are one group, of which one is chosen by its words", async () => {
  const changed = vi.fn();
  render(
    <ChoiceGroup
      label="Start"
      name="start"
      type="radio"
      choices={starts}
      onChange={(event) => changed(event.target.value)}
      error="Say how the arc starts"
    />,
  );
  expect(descriptionOf(screen.getByRole("group", { name: "Start" }))).toBe("Say how the arc starts");
  expect(descriptionOf(screen.getByRole("radio", { name: "Contact" }))).toBe("No high frequency");
  await userEvent.click(screen.getByText("High frequency"));
  await userEvent.click(screen.getByText("Contact"));
  expect(screen.getAllByRole<HTMLInputElement>("radio").map((radio) => radio.checked)).toEqual([false, true]);
  expect(changed.mock.calls.map(([value]) => value)).toEqual(["hf", "contact"]);
});

test("checkboxes show the values they are given", () => {
  render(<ChoiceGroup label="Start" name="start" type="checkbox" choices={starts} value={["contact"]} />);
  const checked = screen.getAllByRole<HTMLInputElement>("checkbox").map((box) => box.checked);
  expect(checked).toEqual([false, true]);
});
