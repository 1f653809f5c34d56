import type { QueryClient } from '@tanstack/react-query';
import type { RouteObject } from 'react-router-dom';

/**
 * The table of pages. A route module under `./routes/` exports `loader` and `Component` and is
 * loaded when it is gone to:
 *
 *     { path: '/machines', lazy: async () => {
 *         const { machinesLoader, MachinesPage } = await import('./routes/machines.tsx');
 *         return { loader: machinesLoader(queryClient), Component: MachinesPage };
 *     } }
 */
export function routes(_queryClient: QueryClient): RouteObject[] {
  return [];
}
