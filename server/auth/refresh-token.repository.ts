import { IsNull, Not, type DataSource } from 'typeorm';
import { RefreshToken } from '#server/db/entities/refresh-token.entity.ts';

export interface NewRefreshToken {
  userId: number;
  tokenHash: string;
  familyId: string;
  expiresAt: Date;
}

/** Keeps the hashed refresh tokens. */
export class RefreshTokenRepository {
  private readonly dataSource: DataSource;

  constructor(dataSource: DataSource) {
    this.dataSource = dataSource;
  }

  private get table() {
    return this.dataSource.getRepository(RefreshToken);
  }

  async add(token: NewRefreshToken): Promise<void> {
    await this.table.insert({ ...token, usedAt: null, revokedAt: null });
  }

  find(tokenHash: string): Promise<RefreshToken | null> {
    return this.table.findOneBy({ tokenHash });
  }

  /** Marks the token used; false if somebody else was faster. */
  async use(id: number, now: Date): Promise<boolean> {
    const result = await this.table.update(
      { id, usedAt: IsNull(), revokedAt: IsNull() },
      { usedAt: now },
    );
    return result.affected === 1;
  }

  /** Ends every session of the person but one. */
  async revokeOthers(userId: number, familyId: string | null, now: Date): Promise<void> {
    await this.table.update(
      { userId, revokedAt: IsNull(), ...(familyId === null ? {} : { familyId: Not(familyId) }) },
      { revokedAt: now },
    );
  }

  async revokeFamily(familyId: string, now: Date): Promise<void> {
    await this.table.update({ familyId, revokedAt: IsNull() }, { revokedAt: now });
  }
}
