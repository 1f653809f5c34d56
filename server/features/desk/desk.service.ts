import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { DeskResponse } from '#shared/contracts/desk.ts';
import { inspectionStates, type InspectionListItem } from '#shared/contracts/inspection.ts';
import type { SiteRole } from '#shared/contracts/session.ts';
import { DeskRepository } from './desk.repository.ts';

const inWorkShown = 200;
const doneShown = 20;
const machinesShown = 20;

interface Neighbours {
  presentInspectionItem: (inspection: Inspection, today: string) => InspectionListItem;
  today: (now: Date) => string;
  membersOf: (siteId: number) => Promise<{ userId: number; name: string; role: SiteRole }[]>;
}

/** The lead's desk: the board of inspections, and who has how much on hand. */
export class DeskService {
  private readonly database: Database;
  private readonly neighbours: Neighbours;
  private readonly now: () => Date;

  constructor(database: Database, neighbours: Neighbours, now: () => Date = () => new Date()) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
  }

  async desk({ siteId }: SitePrincipal): Promise<DeskResponse> {
    const today = this.neighbours.today(this.now());
    const repository = new DeskRepository(this.database.db);
    const columns = [];
    for (const state of inspectionStates) {
      const isDone = state === 'closed' || state === 'cancelled';
      const { total, inspections } = await repository.column(
        siteId,
        state,
        isDone ? 'newest' : 'due',
        isDone ? doneShown : inWorkShown,
      );
      const items = inspections.map((inspection) => ({
        ...this.neighbours.presentInspectionItem(inspection, today),
        assigneeUserId: inspection.assigneeUserId,
        version: inspection.version,
      }));
      columns.push({ state, total, items });
    }
    return {
      columns,
      owners: await this.owners(siteId, today),
      machinesWithoutOwner: await repository.machinesWithoutOwner(siteId, machinesShown),
      today,
    };
  }

  private async owners(siteId: number, today: string): Promise<DeskResponse['owners']> {
    const repository = new DeskRepository(this.database.db);
    const loads = await repository.loads(siteId, today);
    const machineCounts = await repository.machineCounts(siteId);
    const members = await this.neighbours.membersOf(siteId);
    return members
      .filter(({ role }) => role === 'owner')
      .map(({ userId, name }) => {
        const load = loads.find((one) => one.userId === userId);
        return {
          userId,
          name,
          machineCount: machineCounts.get(userId) ?? 0,
          openCount: load?.openCount ?? 0,
          overdueCount: load?.overdueCount ?? 0,
        };
      });
  }
}
