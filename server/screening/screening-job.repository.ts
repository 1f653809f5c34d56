import { In, MoreThanOrEqual, Not } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import { LimitsRepository, methodLimits, type VerdictLimits } from './limits.repository.ts';
import type { EarlierScreening } from '#shared/signal/screening-types.ts';

export interface WaveformJob {
  waveform: Waveform;
  point: MeasuringPoint;
  otherShaftRatios: number[];
  earlier: EarlierScreening[];
  /** In force for the site and the kind of machine when the work began. */
  limits: VerdictLimits;
}

/** Earlier screenings that a new one is set against. */
const earlierMax = 6;
const runTo = 10;

/** The state of each waveform's screening: MariaDB holds the truth, the queue only carries ids. */
export class ScreeningJobRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /**
   * What is marked as running but runs nowhere (the process died, the database was away) waits
   * again. What was running at every one of several deaths is their likely cause and ends as failed.
   *
   * @param exceptIds - what does run
   */
  async takeUpRunning(attemptsMax: number, exceptIds: number[]): Promise<void> {
    const abandoned = {
      screeningState: 'running' as const,
      ...(exceptIds.length === 0 ? {} : { id: Not(In(exceptIds)) }),
    };
    await this.db.update(
      Waveform,
      { ...abandoned, screeningAttempts: MoreThanOrEqual(attemptsMax) },
      {
        screeningState: 'failed',
        screeningFailure: `The server stopped ${attemptsMax} times while this waveform was being screened.`,
      },
    );
    await this.db.update(Waveform, abandoned, { screeningState: 'queued' });
  }

  async queuedIds(limit: number): Promise<number[]> {
    const rows = await this.db.find(Waveform, {
      select: { id: true },
      where: { screeningState: 'queued' },
      order: { id: 'ASC' },
      take: limit,
    });
    return rows.map((row) => row.id);
  }

  /** Takes a waveform for one attempt; null if it isn't waiting any more. */
  async claim(id: number): Promise<WaveformJob | null> {
    const claimed = await this.db.query<{ affectedRows: number }>(
      `UPDATE waveform SET screening_state = 'running', screening_attempts = screening_attempts + 1
        WHERE id = ? AND screening_state = 'queued'`,
      [id],
    );
    if (claimed.affectedRows !== 1) return null;
    const waveform = await this.db.findOneByOrFail(Waveform, { id });
    const point = await this.db.findOneOrFail(MeasuringPoint, {
      where: { id: waveform.measuringPointId },
      relations: { bearingPosition: { machine: true } },
    });
    const machine = point.bearingPosition?.machine;
    return {
      waveform,
      point,
      limits:
        machine === undefined
          ? methodLimits
          : await new LimitsRepository(this.db).inForce(machine.siteId, machine.kind),
      otherShaftRatios: await this.otherShaftRatios(point),
      earlier: await this.earlierOf(waveform),
    };
  }

  /**
   * Writes the result of a run once: a second finish of the same run finds the state moved on and
   * changes nothing.
   *
   * @returns whether this was the first finish
   */
  async finish(
    waveform: Waveform,
    screening: Omit<Screening, 'id' | 'waveform' | 'decidedBy'>,
  ): Promise<boolean> {
    const moved = await this.db.update(
      Waveform,
      { id: waveform.id, screeningState: 'running', screeningRun: waveform.screeningRun },
      { screeningState: 'done', screeningFailure: null },
    );
    if (moved.affected !== 1) return false;
    await this.db.insert(Screening, screening as never);
    return true;
  }

  /** Puts a waveform back, or ends it as failed with the reason. */
  async giveUp(id: number, failure: string, again: boolean): Promise<void> {
    await this.db.update(
      Waveform,
      { id, screeningState: 'running' },
      { screeningState: again ? 'queued' : 'failed', screeningFailure: failure },
    );
  }

  /** Hands back what was taken but not finished, when the process stops: that was no attempt. */
  async handBack(ids: number[]): Promise<void> {
    if (ids.length === 0) return;
    await this.db.update(
      Waveform,
      { id: In(ids), screeningState: 'running' },
      {
        screeningState: 'queued',
        screeningAttempts: () => 'GREATEST(screening_attempts - 1, 0)',
      },
    );
  }

  private async otherShaftRatios(point: MeasuringPoint): Promise<number[]> {
    const position = point.bearingPosition;
    if (position === undefined) return [];
    const rows = await this.db.query<{ ratio: number }[]>(
      'SELECT DISTINCT shaft_ratio AS ratio FROM bearing_position WHERE machine_id = ? AND shaft_ratio <> ?',
      [position.machineId, position.shaftRatio],
    );
    return rows.map((row) => row.ratio);
  }

  private async earlierOf(waveform: Waveform): Promise<EarlierScreening[]> {
    const rows = await this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .where('waveform.measuringPointId = :point', { point: waveform.measuringPointId })
      .andWhere('screening.run = waveform.screeningRun')
      .andWhere('survey.surveyedOn < (SELECT s.surveyed_on FROM survey s WHERE s.id = :survey)', {
        survey: waveform.surveyId,
      })
      .andWhere('screening.score IS NOT NULL')
      .orderBy('survey.surveyedOn', 'DESC')
      .limit(earlierMax)
      .getMany();
    return rows.reverse().map((screening) => presentEarlier(screening));
  }
}

function presentEarlier(screening: Screening): EarlierScreening {
  const { orders, overallVelocity } = screening.result;
  const power = orders
    .filter((line) => Number.isInteger(line.order) && line.order >= 2 && line.order <= runTo)
    .reduce((sum, line) => sum + line.velocityMmPerSRms ** 2, 0);
  const surveyedOn = screening.waveform?.survey?.surveyedOn ?? '1970-01-01';
  return {
    takenAtMs: screening.waveform?.takenAt?.getTime() ?? Date.parse(`${surveyedOn}T00:00:00Z`),
    score: screening.score ?? 0,
    firstOrderMmPerS: orders.find((line) => line.order === 1)?.velocityMmPerSRms ?? 0,
    runMmPerS: Math.sqrt(power),
    overallMmPerS: overallVelocity?.mmPerSRms ?? 0,
  };
}
