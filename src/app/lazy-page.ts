import type { QueryClient } from '@tanstack/react-query';
import type { ComponentType } from 'react';
import type { LoaderFunction, RouteObject } from 'react-router-dom';

interface PageModule {
  /** Fetches what the page shows before it is shown. */
  loader?: (queryClient: QueryClient) => LoaderFunction;
  Component: ComponentType;
}

/** A page whose module is loaded when it is gone to. */
export const lazyPage =
  (queryClient: QueryClient, load: () => Promise<PageModule>): NonNullable<RouteObject['lazy']> =>
  async () => {
    const { loader, Component } = await load();
    return { Component, ...(loader ? { loader: loader(queryClient) } : {}) };
  };
