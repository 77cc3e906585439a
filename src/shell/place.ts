import type { LucideIcon } from "lucide-react";

/** One of the product's parts, as the bars at the top and the bottom lead to it. */
export interface Place {
  label: string;
  to: string;
  icon: LucideIcon;
}
