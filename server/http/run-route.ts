import type { NextFunction, Request, RequestHandler, Response } from 'express';
import type { z } from 'zod';
import type { Principal, SitePrincipal } from '#server/auth/principal.ts';
import type { FieldFault } from '#shared/contracts/error.ts';
import type { SiteRole } from '#shared/contracts/session.ts';
import { AppError, notFound } from './app-error.ts';
import type { Route } from './route.ts';

export interface RouteContext {
  /** Reads the session from the request's cookie; null where there is none or it has run out. */
  principalOf: (req: Request, res: Response) => Promise<Principal | null>;
  /** The person's role at a site; null for who isn't a member. */
  roleAt: (userId: number, siteId: number) => Promise<SiteRole | null>;
}

/** Runs a route, always in this order: authorise, validate, handle, check the answer. */
export function runRoute(route: Route, context: RouteContext): RequestHandler {
  return async (req: Request, res: Response, next: NextFunction) => {
    try {
      const principal = await authorise(route, context, req, res);
      const params = parse(route.params, req.params, 'path');
      const query = parse(route.query, req.query, 'query');
      const body = route.multipart ? undefined : parse(route.body, req.body ?? {}, 'body');
      const answer = await route.handle({ principal, params, query, body, req, res } as never);
      send(route, res, answer);
    } catch (error) {
      next(error);
    }
  };
}

async function authorise(
  route: Route,
  context: RouteContext,
  req: Request,
  res: Response,
): Promise<Principal | SitePrincipal | null> {
  const { access } = route;
  const principal = await context.principalOf(req, res);
  if (access.kind === 'anyone') return principal;
  if (principal === null) throw new AppError('not_signed_in', 'Sign in to go on.');
  if (access.kind === 'signedIn') return principal;
  if (access.kind === 'administrator') {
    if (!principal.isAdministrator)
      throw new AppError('forbidden', 'Only an administrator may do this.');
    return principal;
  }
  const siteId = Number(req.params.siteId);
  const role =
    Number.isSafeInteger(siteId) && siteId > 0
      ? await context.roleAt(principal.userId, siteId)
      : null;
  if (role === null) throw notFound('site');
  if (!access.roles.includes(role)) {
    throw new AppError('forbidden', `Your role at this site (${role}) may not do this.`);
  }
  return { ...principal, siteId, role };
}

function parse(schema: z.ZodType | undefined, value: unknown, where: string): unknown {
  if (schema === undefined) return where === 'path' ? value : undefined;
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  // A path that can't be an id names nothing, which is not a fault of the form.
  if (where === 'path') throw notFound('page');
  const fields: FieldFault[] = parsed.error.issues.map((issue) => ({
    path: issue.path.map(String).join('.'),
    message: issue.message,
  }));
  const first = fields[0];
  throw new AppError(
    'validation',
    first === undefined
      ? 'The input is not as expected.'
      : `${first.path === '' ? 'The input' : `"${first.path}"`}: ${first.message}`,
    { fields },
  );
}

function send(route: Route, res: Response, answer: unknown): void {
  if (route.response === 'binary') return;
  if (route.response === null) {
    res.status(route.status).end();
    return;
  }
  // Parsing the answer strips what the contract doesn't name, and a wrong one is our fault: 500.
  res.status(route.status).json(route.response.parse(answer));
}
