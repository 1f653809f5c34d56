import { useCallback, useEffect, useRef } from 'react';
import { useSearchParams } from 'react-router-dom';

/** State of a list in the address: sort, filters and page can be linked to and gone back to. */
export function useListAddress() {
  const [search, setSearch] = useSearchParams();
  // A second change may come before the address shows the first: it must not undo it.
  const latest = useRef(search);
  useEffect(() => {
    latest.current = search;
  }, [search]);
  const set = useCallback(
    (changes: Record<string, string | number | undefined>) => {
      const after = new URLSearchParams(latest.current);
      for (const [name, value] of Object.entries(changes)) {
        if (value === undefined || value === '') after.delete(name);
        else after.set(name, String(value));
      }
      // Whatever narrows or sorts the list anew begins at its first page.
      if (!('page' in changes)) after.delete('page');
      latest.current = after;
      setSearch(after, { replace: true });
    },
    [setSearch],
  );
  return { search, set };
}

/** The address's values as a contract's query; what the contract refuses is left out. */
export function readListQuery<Query>(
  schema: { safeParse: (value: unknown) => { success: boolean; data?: Query } },
  search: URLSearchParams,
): Query {
  const whole = schema.safeParse(Object.fromEntries(search));
  if (whole.success && whole.data !== undefined) return whole.data;
  const kept = [...search].filter(([name, value]) => schema.safeParse({ [name]: value }).success);
  const rest = schema.safeParse(Object.fromEntries(kept));
  if (rest.data === undefined) throw new Error('A list query without values must be valid.');
  return rest.data;
}
