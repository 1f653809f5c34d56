import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { OutcomesResponse } from '#shared/contracts/outcomes.ts';
import { OutcomesRepository } from './outcomes.repository.ts';
import { summariseOutcomes } from './summarise-outcomes.ts';

/** What became of the flags of a site. */
export class OutcomesService {
  private readonly database: Database;

  constructor(database: Database) {
    this.database = database;
  }

  async outcomes({ siteId }: SitePrincipal): Promise<OutcomesResponse> {
    const repository = new OutcomesRepository(this.database.db);
    const [counts, cases] = await Promise.all([
      repository.flagCounts(siteId),
      repository.cases(siteId),
    ]);
    const countOf = (decision: 'accepted' | 'rejected' | 'retake' | null) =>
      counts.get(decision) ?? 0;
    return {
      flags: {
        flaggedCount: [...counts.values()].reduce((sum, count) => sum + count, 0),
        acceptedCount: countOf('accepted'),
        rejectedCount: countOf('rejected'),
        retakeCount: countOf('retake'),
        waitingCount: countOf(null),
      },
      ...summariseOutcomes(cases),
    };
  }
}
