import { cleanup, render, screen, waitFor } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { NotFoundPage, RouteErrorPage } from '#src/app/error-pages.tsx';
import { ApiError } from '#src/lib/api-error.ts';

// React and the router report a caught error on the console; here it is what the test is about.
beforeEach(() => {
  vi.spyOn(console, 'error').mockImplementation(() => undefined);
});
afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
});

async function show(error: unknown) {
  const router = createMemoryRouter([
    {
      path: '/',
      loader: () => Promise.reject(error),
      element: <p>the page</p>,
      errorElement: <RouteErrorPage />,
      hydrateFallbackElement: <></>,
    },
    { path: '*', element: <NotFoundPage /> },
  ]);
  render(<RouterProvider router={router} />);
  return (await screen.findByRole('alert')).textContent ?? '';
}

describe('a page that can’t be shown', () => {
  it('says that it is not here, whether removed or someone else’s', async () => {
    const words = await show(new ApiError('not_found', 'No such machine.', { status: 404 }));
    expect(words).toMatch(/^This page is not here\./u);
    screen.getByRole('link', { name: 'Start page' });
    // The title follows a moment after the page.
    await waitFor(() => expect(document.title).toBe('This page is not here. – Fretline'));
  });

  it('says what is safe when the server is away, and offers to load again', async () => {
    const words = await show(new ApiError('unreachable', '', { status: 0 }));
    expect(words).toMatch(/What was saved before is safe on the server/u);
    screen.getByRole('button', { name: 'Load the page again' });
  });

  it('shows the id of a failure', async () => {
    const fault = new ApiError('internal', 'Something failed.', { status: 500, id: '01ABC' });
    expect(await show(fault)).toMatch(/Error 01ABC/u);
  });

  it('does not show the words of a fault of this program', async () => {
    const words = await show(new TypeError('x is undefined'));
    expect(words).toMatch(/^This page broke down\./u);
    expect(words).not.toMatch(/undefined/u);
  });
});
