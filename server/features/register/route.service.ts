import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  CreateRouteRequest,
  RouteListQuery,
  RouteResponse,
  UpdateRouteRequest,
} from '#shared/contracts/route.ts';
import { mayEditRegister } from './machine.policy.ts';
import { RouteRepository } from './route.repository.ts';

/** Routes: which points are walked in which order. */
export class RouteService {
  private readonly database: Database;

  constructor(database: Database) {
    this.database = database;
  }

  list(principal: SitePrincipal, query: RouteListQuery) {
    return new RouteRepository(this.database.db).list(principal.siteId, query);
  }

  pointChoices(principal: SitePrincipal) {
    return new RouteRepository(this.database.db).choices(principal.siteId);
  }

  async whole(principal: SitePrincipal, routeId: number): Promise<RouteResponse> {
    const repository = new RouteRepository(this.database.db);
    const route = await repository.find(principal.siteId, routeId);
    if (route === null) throw notFound('route');
    return {
      id: route.id,
      name: route.name,
      topFrequencyHz: route.topFrequencyHz,
      lineCount: route.lineCount,
      version: route.version,
      points: await repository.pointsOf(routeId),
      can: { edit: mayEditRegister(principal), startSurvey: true },
    };
  }

  async create(principal: SitePrincipal, request: CreateRouteRequest): Promise<RouteResponse> {
    const { pointIds, ...fields } = request;
    await this.checkPoints(principal.siteId, pointIds);
    const id = await this.database.transaction(async (db) => {
      const repository = new RouteRepository(db);
      const created = await repository
        .insert({ ...fields, siteId: principal.siteId })
        .catch(refuseTakenName(request.name));
      await repository.setPoints(created, pointIds);
      await recordActivity(db, { ...entryOf(principal, created), action: 'route.created' });
      return created;
    });
    return this.whole(principal, id);
  }

  async update(
    principal: SitePrincipal,
    routeId: number,
    request: UpdateRouteRequest,
  ): Promise<RouteResponse> {
    const { pointIds, version, ...changes } = request;
    const before = await this.whole(principal, routeId);
    if (pointIds !== undefined) await this.checkPoints(principal.siteId, pointIds);
    await this.database.transaction(async (db) => {
      const repository = new RouteRepository(db);
      const written = await repository
        .update(routeId, version, changes)
        .catch(refuseTakenName(changes.name ?? before.name));
      if (!written) {
        throw new AppError(
          'conflict',
          'Somebody else has changed this route since you opened it. Your changes were not saved: reload to see theirs.',
        );
      }
      if (pointIds !== undefined) await repository.setPoints(routeId, pointIds);
      await recordActivity(db, { ...entryOf(principal, routeId), action: 'route.changed' });
    });
    return this.whole(principal, routeId);
  }

  private async checkPoints(siteId: number, pointIds: number[]): Promise<void> {
    const known = await new RouteRepository(this.database.db).countOfSite(siteId, pointIds);
    if (known === pointIds.length) return;
    const message = 'A measuring point of the list does not exist at this site.';
    throw new AppError('validation', message, { fields: [{ path: 'pointIds', message }] });
  }
}

const entryOf = (principal: SitePrincipal, routeId: number) => ({
  siteId: principal.siteId,
  userId: principal.userId,
  objectType: 'route',
  objectId: routeId,
});

const refuseTakenName = (name: string) => (error: unknown) => {
  if (!isDuplicateKey(error)) throw error;
  const message = `There is already a route named ${name}.`;
  throw new AppError('conflict', message, { cause: error, fields: [{ path: 'name', message }] });
};
