import { useSyncExternalStore } from "react";

/** Whether a media query holds now. Where nothing can be asked, it does not. */
export function useMediaQuery(query: string): boolean {
  return useSyncExternalStore(
    (changed) => {
      const list = globalThis.matchMedia?.(query);
      list?.addEventListener("change", changed);
      return () => list?.removeEventListener("change", changed);
    },
    () => globalThis.matchMedia?.(query).matches ?? false,
  );
}

/** Narrower than a desk: cards instead of tables, bars at the bottom. */
export const usePhone = () => useMediaQuery("screen and (max-width: 47.99rem)");
