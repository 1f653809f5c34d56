import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { AppError } from '#server/http/app-error.ts';
import type { ChangePasswordRequest } from '#shared/contracts/account.ts';
import type { AccountRepository } from './account.repository.ts';
import { hashPassword, passwordMatches } from './passwords.ts';
import type { RefreshTokenRepository } from './refresh-token.repository.ts';

const hashOf = (token: string) => createHash('sha256').update(token).digest('hex');

/**
 * Two tabs that wake up together send the same refresh token. Within this grace the second is
 * taken for that and gets a token of its own; later it is taken for a copy.
 */
const reuseGraceMs = 20_000;

export interface IssuedSession {
  userId: number;
  refreshToken: string;
  refreshExpiresAt: Date;
}

/** Sign-in, renewal with rotating refresh tokens, sign-out. */
export class SessionService {
  private readonly accounts: AccountRepository;
  private readonly tokens: RefreshTokenRepository;
  private readonly refreshLifeS: number;
  private readonly now: () => Date;
  /** Verified against when the e-mail is unknown, so that both answers take the same time. */
  private readonly decoyHash = hashPassword(randomBytes(16).toString('hex'));

  constructor(
    accounts: AccountRepository,
    tokens: RefreshTokenRepository,
    refreshLifeS: number,
    now: () => Date = () => new Date(),
  ) {
    this.accounts = accounts;
    this.tokens = tokens;
    this.refreshLifeS = refreshLifeS;
    this.now = now;
  }

  async signIn(email: string, password: string): Promise<IssuedSession> {
    const user = await this.accounts.findByEmail(email);
    const right = await passwordMatches(user?.passwordHash ?? (await this.decoyHash), password);
    if (user === null || !right) {
      throw new AppError('wrong_credentials', 'The e-mail address or the password is not right.');
    }
    return this.issue(user.id, randomUUID());
  }

  async renew(refreshToken: string): Promise<IssuedSession> {
    const known = await this.tokens.find(hashOf(refreshToken));
    const now = this.now();
    const over = new AppError('not_signed_in', 'Your session has ended. Sign in again.');
    if (known === null || known.revokedAt !== null || known.expiresAt <= now) throw over;
    if (known.usedAt !== null || !(await this.tokens.use(known.id, now))) {
      const usedAtMs = known.usedAt?.getTime() ?? now.getTime();
      if (now.getTime() - usedAtMs > reuseGraceMs) {
        await this.tokens.revokeFamily(known.familyId, now);
        throw over;
      }
    }
    return this.issue(known.userId, known.familyId);
  }

  /**
   * Sets a new password and ends every other session of the person: whoever knew the old one is out
   * when their access token has run out.
   *
   * @param refreshToken - that of the session in which the password is changed
   */
  async changePassword(
    userId: number,
    { currentPassword, newPassword }: ChangePasswordRequest,
    refreshToken: string | undefined,
  ): Promise<void> {
    const user = await this.accounts.findById(userId);
    if (user === null || !(await passwordMatches(user.passwordHash, currentPassword))) {
      const message = 'This is not your present password.';
      throw new AppError('validation', message, { fields: [{ path: 'currentPassword', message }] });
    }
    if (currentPassword === newPassword) {
      const message = 'Choose another password than the present one.';
      throw new AppError('validation', message, { fields: [{ path: 'newPassword', message }] });
    }
    await this.accounts.setPasswordHash(userId, await hashPassword(newPassword));
    const own = refreshToken === undefined ? null : await this.tokens.find(hashOf(refreshToken));
    const familyId = own?.userId === userId ? own.familyId : null;
    await this.tokens.revokeOthers(userId, familyId, this.now());
  }

  async signOut(refreshToken: string): Promise<void> {
    const known = await this.tokens.find(hashOf(refreshToken));
    if (known !== null) await this.tokens.revokeFamily(known.familyId, this.now());
  }

  private async issue(userId: number, familyId: string): Promise<IssuedSession> {
    const refreshToken = randomBytes(32).toString('base64url');
    const refreshExpiresAt = new Date(this.now().getTime() + this.refreshLifeS * 1000);
    await this.tokens.add({
      userId,
      tokenHash: hashOf(refreshToken),
      familyId,
      expiresAt: refreshExpiresAt,
    });
    return { userId, refreshToken, refreshExpiresAt };
  }
}
