import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Access } from '#server/auth/access.ts';
import type { Principal, SitePrincipal } from '#server/auth/principal.ts';

/** A handler's answer that isn't JSON: the handler has written the response itself. */
export const handled = 'handled' as const;

type Output<S, Otherwise> = S extends z.ZodType ? z.output<S> : Otherwise;
type PrincipalOf<A extends Access> = A extends { kind: 'anyone' }
  ? Principal | null
  : A extends { kind: 'siteRoles' }
    ? SitePrincipal
    : Principal;

export interface Call<A extends Access, P, Q, B> {
  principal: PrincipalOf<A>;
  params: P;
  query: Q;
  body: B;
  req: Request;
  res: Response;
}

/** A route as data, with its types forgotten: what the runner and the table tests read. */
export interface Route {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  path: string;
  status: number;
  access: Access;
  params?: z.ZodType;
  query?: z.ZodType;
  body?: z.ZodType;
  /** A multipart route takes its body from the stream itself. */
  multipart: boolean;
  response: z.ZodType | 'binary' | null;
  handle: (call: Call<Access, unknown, unknown, unknown>) => Promise<unknown>;
}

interface RouteOptions<
  A extends Access,
  P extends z.ZodType | undefined,
  Q extends z.ZodType | undefined,
  B extends z.ZodType | undefined,
  R extends z.ZodType | 'binary' | null,
> {
  method: Route['method'];
  path: A extends { kind: 'siteRoles' } ? `${string}:siteId${string}` : string;
  status?: number;
  access: A;
  params?: P;
  query?: Q;
  body?: B;
  multipart?: boolean;
  /** Parsed before it is sent; null: no content; 'binary': the handler streams and returns `handled`. */
  response: R;
  handle: (
    call: Call<A, Output<P, Record<string, string>>, Output<Q, undefined>, Output<B, undefined>>,
  ) => Promise<R extends z.ZodType ? z.input<R> : R extends 'binary' ? typeof handled : void>;
}

/**
 * Declares a route. Access and response are required, so a route that forgets who may call it or
 * what it sends does not compile; one place (`run-route.ts`) runs them all in the same order.
 */
export function route<
  A extends Access,
  R extends z.ZodType | 'binary' | null,
  P extends z.ZodType | undefined = undefined,
  Q extends z.ZodType | undefined = undefined,
  B extends z.ZodType | undefined = undefined,
>(options: RouteOptions<A, P, Q, B, R>): Route {
  const { status, multipart = false, ...rest } = options;
  return {
    ...rest,
    status: status ?? (options.response === null ? 204 : 200),
    multipart,
    handle: options.handle as Route['handle'],
  };
}
