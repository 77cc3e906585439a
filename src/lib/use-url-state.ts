import { useMemo } from "react";
import { useSearchParams } from "react-router-dom";

export type UrlState = Record<string, string>;

/**
 * Search, filters, sort and paging of a page, kept in its URL so that they survive reload, Back and being sent to somebody.
 * Only what differs from `defaults` is written. Any change but of the cursor goes back to the first page.
 */
export function useUrlState<State extends UrlState>(
  defaults: State,
): [State & { cursor?: string }, (patch: Partial<State>, options?: { replace?: boolean }) => void] {
  const [params, setParams] = useSearchParams();

  const state = useMemo(() => {
    const read: UrlState = {};
    for (const name of Object.keys(defaults)) read[name] = params.get(name) ?? defaults[name]!;
    const cursor = params.get("cursor");
    return { ...read, ...(cursor === null ? {} : { cursor }) } as State & { cursor?: string };
  }, [params, defaults]);

  function change(patch: Partial<State>, { replace = true } = {}): void {
    setParams(
      (current) => {
        const next = new URLSearchParams(current);
        next.delete("cursor");
        for (const [name, value] of Object.entries(patch)) {
          if (value === undefined || value === defaults[name]) next.delete(name);
          else next.set(name, value);
        }
        return next;
      },
      { replace },
    );
  }

  return [state, change];
}
