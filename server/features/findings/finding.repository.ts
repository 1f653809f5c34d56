import { In, MoreThan, Not } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { FindingScreening } from '#server/db/entities/finding-screening.entity.ts';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { StateChange } from '#server/db/entities/state-change.entity.ts';
import { likePattern } from '#server/db/like-pattern.ts';
import type { FindingListQuery, FindingState } from '#shared/contracts/finding.ts';
import { finishedFindingStates } from './finding-transitions.ts';

const sortColumns: Record<FindingListQuery['sort'], string> = {
  openedAt: 'finding.opened_at',
  state:
    "FIELD(finding.state, 'open', 'inspecting', 'monitoring', 'repaired', 'verified', 'dismissed')",
  machineTag: 'machine.tag',
  score:
    '(SELECT MAX(s.score) FROM finding_screening fs JOIN screening s ON s.id = fs.screening_id WHERE fs.finding_id = finding.id)',
};

/** Surveys with a screening of the finding's position, dated after the day monitoring began. */
const surveyCountSql = `(SELECT COUNT(DISTINCT sv.id)
  FROM measuring_point mp
  JOIN waveform wf ON wf.measuring_point_id = mp.id AND wf.screening_state = 'done'
  JOIN survey sv ON sv.id = wf.survey_id
  WHERE mp.bearing_position_id = finding.bearing_position_id
    AND sv.surveyed_on > DATE(finding.monitored_since))`;

/** The last thing done with a finding, as its activity record tells it. */
export interface FindingChange {
  /** The entry's action without "finding.". */
  event: string;
  userName: string;
  at: Date;
  /** Why, where the step has a reason. */
  reason: string | null;
}

/** Findings, the screenings that show them and the record of their states. */
export class FindingRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** One page of a site's findings; `ownerUserId` narrows it to an owner's machines. */
  async list(siteId: number, ownerUserId: number | null, query: FindingListQuery, today: string) {
    const found = this.db
      .createQueryBuilder(Finding, 'finding')
      .innerJoinAndSelect('finding.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .leftJoinAndSelect('machine.owner', 'owner')
      .where('finding.siteId = :siteId', { siteId });
    if (ownerUserId !== null) {
      found.andWhere('machine.ownerUserId = :ownerUserId', { ownerUserId });
    }
    if (query.state !== undefined) found.andWhere('finding.state = :state', { state: query.state });
    if (query.active === true) {
      found.andWhere('finding.state NOT IN (:...finished)', { finished: finishedFindingStates });
    }
    if (query.overdue === true) {
      found
        .andWhere("finding.state = 'monitoring'")
        .andWhere(
          `(finding.monitor_until_on < :today OR ${surveyCountSql} >= finding.monitor_surveys)`,
          {
            today,
          },
        );
    }
    if (query.search) {
      found.andWhere(
        '(machine.tag LIKE :pattern OR machine.name LIKE :pattern OR position.code LIKE :pattern OR position.name LIKE :pattern)',
        { pattern: likePattern(query.search) },
      );
    }
    const total = await found.clone().getCount();
    const direction = query.direction === 'desc' ? 'DESC' : 'ASC';
    const rows = await found
      .addSelect(sortColumns[query.sort], 'sort_key')
      .orderBy('sort_key', direction)
      .addOrderBy('finding.id', direction)
      .limit(query.pageSize)
      .offset((query.page - 1) * query.pageSize)
      .getMany();
    return { rows, total };
  }

  /** Surveys that measured the position of each monitored finding since it is monitored. */
  async surveyCounts(findingIds: number[]): Promise<Map<number, number>> {
    if (findingIds.length === 0) return new Map();
    const rows = await this.db
      .createQueryBuilder(Finding, 'finding')
      .select('finding.id', 'id')
      .addSelect(surveyCountSql, 'count')
      .where('finding.id IN (:...findingIds)', { findingIds })
      .andWhere("finding.state = 'monitoring'")
      .getRawMany<{ id: number; count: string }>();
    return new Map(rows.map(({ id, count }) => [id, Number(count)]));
  }

  find(siteId: number, id: number): Promise<Finding | null> {
    return this.db.findOne(Finding, {
      where: { id, siteId },
      relations: { bearingPosition: { machine: { owner: true } } },
    });
  }

  /** The screenings of several findings, oldest survey first. */
  screeningsOf(findingIds: number[]): Promise<FindingScreening[]> {
    if (findingIds.length === 0) return Promise.resolve([]);
    return this.db
      .createQueryBuilder(FindingScreening, 'link')
      .innerJoinAndSelect('link.screening', 'screening')
      .leftJoinAndSelect('screening.decidedBy', 'decidedBy')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .where('link.findingId IN (:...findingIds)', { findingIds })
      .orderBy('survey.surveyedOn', 'ASC')
      .addOrderBy('point.id', 'ASC')
      .addOrderBy('screening.id', 'ASC')
      .getMany();
  }

  historyOf(findingId: number): Promise<StateChange[]> {
    return this.db.find(StateChange, {
      where: { findingId },
      relations: { changedBy: true },
      order: { changedAt: 'ASC', id: 'ASC' },
    });
  }

  async lastChangeOf({ id, siteId }: Finding): Promise<FindingChange | null> {
    const [row] = await this.db.query<
      { action: string; name: string | null; happened_at: Date; reason: string | null }[]
    >(
      `SELECT activity.action, user.name, activity.happened_at,
              (SELECT step.reason FROM state_change step
                WHERE step.finding_id = activity.object_id AND step.inspection_id IS NULL
                  AND step.changed_at = activity.happened_at
                ORDER BY step.id DESC LIMIT 1) AS reason
         FROM activity LEFT JOIN user ON user.id = activity.user_id
        WHERE activity.site_id = ? AND activity.object_type = 'finding' AND activity.object_id = ?
        ORDER BY activity.happened_at DESC, activity.id DESC LIMIT 1`,
      [siteId, id],
    );
    if (row === undefined) return null;
    return {
      event: row.action.replace(/^finding\./, ''),
      userName: row.name ?? 'Somebody',
      at: row.happened_at,
      reason: row.reason,
    };
  }

  /** The finding as it is now, held against others. */
  lock(id: number): Promise<Finding | null> {
    return this.db.findOne(Finding, { where: { id }, lock: { mode: 'pessimistic_write' } });
  }

  /** The position's finding that isn't done with, held against others. */
  lockActiveOf(bearingPositionId: number, exceptId = 0): Promise<Finding | null> {
    return this.db.findOne(Finding, {
      where: {
        bearingPositionId,
        id: Not(exceptId),
        state: Not(In([...finishedFindingStates])),
      },
      order: { id: 'DESC' },
      lock: { mode: 'pessimistic_write' },
    });
  }

  lockLinkOf(screeningId: number): Promise<FindingScreening | null> {
    return this.db.findOne(FindingScreening, {
      where: { screeningId },
      order: { findingId: 'DESC' },
      lock: { mode: 'pessimistic_write' },
    });
  }

  async insert(finding: Pick<Finding, 'siteId' | 'bearingPositionId' | 'state' | 'openedAt'>) {
    const result = await this.db.insert(Finding, { ...finding, version: 1 });
    return (result.identifiers[0] as { id: number }).id;
  }

  async link(findingId: number, screeningId: number): Promise<void> {
    await this.db.insert(FindingScreening, { findingId, screeningId });
  }

  async unlink(findingId: number, screeningId: number): Promise<void> {
    await this.db.delete(FindingScreening, { findingId, screeningId });
  }

  linkCount(findingId: number): Promise<number> {
    return this.db.count(FindingScreening, { where: { findingId } });
  }

  changesSince(findingId: number, since: Date): Promise<number> {
    return this.db.count(StateChange, { where: { findingId, changedAt: MoreThan(since) } });
  }

  async remove(findingId: number): Promise<void> {
    await this.db.delete(Finding, { id: findingId });
  }

  /** Writes state and version of a finding that the caller holds. */
  async write(
    finding: Finding,
    state: FindingState,
    monitoring: Partial<Pick<Finding, 'monitoredSince' | 'monitorUntilOn' | 'monitorSurveys'>> = {},
  ): Promise<void> {
    await this.db.update(
      Finding,
      { id: finding.id },
      { ...monitoring, state, version: finding.version + 1 },
    );
  }

  async addStateChange(
    change: Omit<StateChange, 'id' | 'finding' | 'changedBy' | 'inspectionId'>,
  ): Promise<void> {
    await this.db.insert(StateChange, { ...change, inspectionId: null });
  }
}
