import type { SharingLevel } from "#shared/contracts/recipes.ts";
import type { Sharing } from "#shared/contracts/sharing.ts";

export const levelHints: Record<SharingLevel, string> = {
  private: "Nobody outside the shop learns of it.",
  counted: "Its setpoints enter the peers' figures, mixed with those of other shops.",
  listed: "Counted, and a nameless, rounded copy of it is shown to members.",
};

export const notCountedWords: Record<NonNullable<Sharing["notCountedBecause"]>, string> = {
  "not-proven": "The newest version has no acceptable test cut yet. Log one, and it counts from the next edition on.",
  retired: "It is retired. Bring it back, and it counts from the next edition on.",
  "shop-suspended": "Your shop is suspended. Its recipes count again once that ends.",
  "newer-recipe-counts":
    "Another shared recipe of this machine and peer group was proven later. Of each machine only the newest counts.",
};

/** What happens on saving, as the button says it. */
export function actWords(from: SharingLevel, to: SharingLevel): string {
  if (from === to) return "Save the words";
  if (to === "listed") return "List it";
  return from === "listed" ? "Take it off the list, keep it counted" : "Have it counted";
}

export const savedWords: Record<SharingLevel, string> = {
  private: "Withdrawn. The next edition goes without it.",
  counted: "Shared. It counts from the next edition on.",
  listed: "Shared. It is listed from the next edition on.",
};
