import { useLocation } from "react-router-dom";
import { signInHref } from "../lib/sign-in-href.ts";
import { buttonClasses } from "../ui/button.tsx";

/** Leaves the page for the sign-in provider and comes back to the same place. */
export function SignInLink() {
  const { pathname, search } = useLocation();
  return (
    <a href={signInHref(pathname + search)} className={buttonClasses("primary", true)}>
      Sign in
    </a>
  );
}
