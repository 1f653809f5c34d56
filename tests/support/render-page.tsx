import { QueryClientProvider } from '@tanstack/react-query';
import { configure, render } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { vi } from 'vitest';
import { ToastProvider } from '#src/components/toast.tsx';
import { routeTree } from '#src/app/router.tsx';
import { createQueryClient } from '#src/lib/query-client.ts';

// The first page of a file loads its modules on a busy machine.
configure({ asyncUtilTimeout: 10_000 });
window.scrollTo = () => undefined;

export interface SentRequest {
  /** "POST /api/…" without the query. */
  call: string;
  body: unknown;
}

type Answer = object | Float32Array<ArrayBuffer> | (() => object | Response);

const asResponse = (answer: object | Response): Response => {
  if (answer instanceof Response) return answer;
  if (answer instanceof Float32Array) return new Response(answer.slice().buffer);
  return Response.json(answer);
};

/** The refusal as the server words it. */
export const refusal = (status: number, code: string, message: string) =>
  Response.json({ error: { code, message, id: 'test' } }, { status });

/**
 * Renders the page at an address with the real router and query client. The network answers what
 * is given by "METHOD /path" and refuses everything else.
 *
 * @returns the requests sent that change something, as they are sent
 */
export function renderPage(path: string, answers: Readonly<Record<string, Answer>>) {
  const sent: SentRequest[] = [];
  vi.stubGlobal('fetch', (input: RequestInfo | URL, init: RequestInit = {}) => {
    const address = new URL(String(input instanceof Request ? input.url : input), 'http://page');
    const method = init.method ?? 'GET';
    const call = `${method} ${address.pathname}`;
    if (method !== 'GET') {
      const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : undefined;
      sent.push({ call, body });
    }
    const answer = answers[call];
    if (answer === undefined) return Promise.reject(new Error(`Unknown request: ${call}`));
    return Promise.resolve(asResponse(typeof answer === 'function' ? answer() : answer));
  });
  const queryClient = createQueryClient();
  const router = createMemoryRouter(routeTree(queryClient), { initialEntries: [path] });
  render(
    <QueryClientProvider client={queryClient}>
      <ToastProvider>
        <RouterProvider router={router} />
      </ToastProvider>
    </QueryClientProvider>,
  );
  return { sent, router };
}
