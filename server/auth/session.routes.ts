import type { CookieOptions, Request, Response } from 'express';
import type { Config } from '#server/config/config.ts';
import { AppError } from '#server/http/app-error.ts';
import { route } from '#server/http/route.ts';
import { changePasswordRequest } from '#shared/contracts/account.ts';
import { productResponse, sessionResponse, signInRequest } from '#shared/contracts/session.ts';
import type { ProductResponse, SessionResponse } from '#shared/contracts/session.ts';
import { anyoneBecause, signedIn } from './access.ts';
import { accessCookie, signAccessToken } from './access-token.ts';
import type { AccountRepository } from './account.repository.ts';
import type { Principal } from './principal.ts';
import type { IssuedSession, SessionService } from './session.service.ts';

export const refreshCookie = 'fretline_refresh';
const refreshPath = '/api/session';

interface Dependencies {
  sessions: SessionService;
  accounts: AccountRepository;
  demoAccounts: ProductResponse['demoAccounts'];
  config: Pick<Config, 'authSecret' | 'accessTokenLifeS' | 'demo' | 'publicUrl'>;
}

/** Sign-in, renewal, sign-out and who is signed in. */
export function sessionRoutes({ sessions, accounts, demoAccounts, config }: Dependencies) {
  // Plain http on loopback: a Secure cookie would never come back there.
  const secure = config.publicUrl?.startsWith('https:') ?? false;
  const cookie = { httpOnly: true, sameSite: 'strict', secure } satisfies CookieOptions;

  const setCookies = (res: Response, session: IssuedSession) => {
    res.cookie(
      accessCookie,
      signAccessToken(session.userId, config.authSecret, config.accessTokenLifeS),
      { ...cookie, path: '/api', maxAge: config.accessTokenLifeS * 1000 },
    );
    res.cookie(refreshCookie, session.refreshToken, {
      ...cookie,
      path: refreshPath,
      expires: session.refreshExpiresAt,
    });
  };
  const clearCookies = (res: Response) => {
    res.clearCookie(accessCookie, { ...cookie, path: '/api' });
    res.clearCookie(refreshCookie, { ...cookie, path: refreshPath });
  };
  const refreshTokenOf = (req: Request) =>
    (req.cookies as Record<string, string | undefined>)[refreshCookie];

  const describe = async (principal: Principal): Promise<SessionResponse> => ({
    ...principal,
    memberships: await accounts.membershipsOf(principal.userId),
    demo: config.demo,
  });
  const describeUser = async (userId: number): Promise<SessionResponse> => {
    const user = await accounts.findById(userId);
    if (user === null) throw new AppError('not_signed_in', 'This account no longer exists.');
    return describe({
      userId: user.id,
      name: user.name,
      email: user.email,
      isAdministrator: user.isAdministrator,
    });
  };

  return [
    route({
      method: 'get',
      path: '/api/product',
      access: anyoneBecause('the sign-in page shows the demo accounts before anyone has signed in'),
      response: productResponse,
      handle: async () => ({ demo: config.demo, demoAccounts: config.demo ? demoAccounts : [] }),
    }),
    route({
      method: 'post',
      path: '/api/session',
      access: anyoneBecause('this is how a person signs in'),
      body: signInRequest,
      response: sessionResponse,
      handle: async ({ body, res }) => {
        const session = await sessions.signIn(body.email, body.password);
        setCookies(res, session);
        return describeUser(session.userId);
      },
    }),
    route({
      method: 'post',
      path: '/api/session/refresh',
      access: anyoneBecause('the access token has run out; the refresh token is the proof'),
      response: sessionResponse,
      handle: async ({ req, res }) => {
        const token = refreshTokenOf(req);
        if (token === undefined) throw new AppError('not_signed_in', 'Sign in to go on.');
        try {
          const session = await sessions.renew(token);
          setCookies(res, session);
          return await describeUser(session.userId);
        } catch (error) {
          clearCookies(res);
          throw error;
        }
      },
    }),
    route({
      method: 'delete',
      path: '/api/session',
      access: anyoneBecause('signing out must work with a session that has run out'),
      response: null,
      handle: async ({ req, res }) => {
        const token = refreshTokenOf(req);
        if (token !== undefined) await sessions.signOut(token);
        clearCookies(res);
      },
    }),
    route({
      method: 'post',
      // Below /api/session, where the refresh cookie is sent: it tells which session is to stay.
      path: '/api/session/password',
      access: signedIn(),
      body: changePasswordRequest,
      response: null,
      handle: ({ principal, body, req }) =>
        sessions.changePassword(principal.userId, body, refreshTokenOf(req)),
    }),
    route({
      method: 'get',
      path: '/api/session',
      access: signedIn(),
      response: sessionResponse,
      handle: ({ principal }) => describe(principal),
    }),
  ];
}
