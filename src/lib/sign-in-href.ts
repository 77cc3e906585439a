/** Where signing in starts. `returnTo` is a path of this site, opened again afterwards. */
export function signInHref(returnTo: string): string {
  return `/auth/sign-in?${new URLSearchParams({ returnTo })}`;
}
