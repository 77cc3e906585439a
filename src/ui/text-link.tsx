import { Link, type LinkProps } from "react-router-dom";
import { classNames } from "./class-names.ts";

export const linkClasses =
  "text-action underline decoration-1 underline-offset-2 hover:text-action-hover hover:decoration-2";

/** A link inside the product, in running text or a cell. */
export function TextLink({ className, ...rest }: LinkProps) {
  return <Link {...rest} className={classNames(linkClasses, className as string | undefined)} />;
}
