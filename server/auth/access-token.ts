import jwt from 'jsonwebtoken';
import passport from 'passport';
import { Strategy } from 'passport-jwt';
import type { Request, Response } from 'express';

export const accessCookie = 'fretline_access';

interface AccessClaims {
  sub: string;
}

export const signAccessToken = (userId: number, secret: string, lifeS: number) =>
  jwt.sign({ sub: String(userId) } satisfies AccessClaims, secret, {
    algorithm: 'HS256',
    expiresIn: lifeS,
  });

/** A passport of our own with the one strategy: the JWT of the access cookie. */
export function accessTokenReader(secret: string) {
  const authenticator = new passport.Passport();
  authenticator.use(
    new Strategy(
      {
        secretOrKey: secret,
        algorithms: ['HS256'],
        jwtFromRequest: (req: Request) =>
          (req.cookies as Record<string, string> | undefined)?.[accessCookie] ?? null,
      },
      (claims: AccessClaims, done: (error: unknown, user?: { userId: number }) => void) =>
        done(null, { userId: Number(claims.sub) }),
    ),
  );
  /** The user id of a valid token; null where there is none or it has run out. */
  return (req: Request, res: Response): Promise<number | null> =>
    new Promise((resolve, reject) => {
      const answer = (error: unknown, user: { userId: number } | false) =>
        error ? reject(error as Error) : resolve(user === false ? null : user.userId);
      (
        authenticator.authenticate('jwt', { session: false }, answer) as (
          req: Request,
          res: Response,
          next: (error?: unknown) => void,
        ) => void
      )(req, res, (error) => (error ? reject(error as Error) : resolve(null)));
    });
}
