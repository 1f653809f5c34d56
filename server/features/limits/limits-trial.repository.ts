import type { Db } from '#server/db/database.ts';
import type { VerdictLimits } from '#server/screening/limits.repository.ts';
import type { InspectionOutcome } from '#shared/contracts/inspection.ts';
import type { MachineKind } from '#shared/contracts/machine.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { ReviewDecision } from '#shared/contracts/review.ts';
import { methodVersion } from '#shared/signal/screen-waveform.ts';
import type { Verdict } from '#shared/signal/screening-types.ts';

/** The machines a trial looks at: one kind, or all but the kinds that have limits of their own. */
export interface TrialScope {
  siteId: number;
  machineKind: MachineKind | null;
  exceptKinds: readonly MachineKind[];
}

export interface TrialRow {
  screeningId: number;
  surveyId: number;
  surveyedOn: string;
  machineTag: string;
  positionCode: string;
  positionName: string;
  direction: Direction;
  score: number;
  verdict: Verdict;
  decision: ReviewDecision | null;
  outcome: InspectionOutcome | null;
  reportedAt: Date | null;
}

/** Past screenings for a trial of limits. */
export class LimitsTrialRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async machineCounts(siteId: number): Promise<{ machineKind: MachineKind; count: number }[]> {
    const rows = await this.db.query<{ machineKind: MachineKind; count: string | number }[]>(
      'SELECT kind AS machineKind, COUNT(*) AS count FROM machine WHERE site_id = ? GROUP BY kind ORDER BY kind',
      [siteId],
    );
    return rows.map((row) => ({ ...row, count: Number(row.count) }));
  }

  /** Judged screenings of the scope by what both pairs of limits make of them. */
  async counts(scope: TrialScope, now: VerdictLimits, tried: VerdictLimits) {
    const { where, values } = conditionOf(scope);
    const [row] = await this.db.query<Record<string, string | number | null>[]>(
      `SELECT COUNT(*) AS screeningCount,
              SUM(screening.score >= ?) AS flagsNowCount,
              SUM(screening.score >= ?) AS flagsThenCount,
              SUM(screening.score >= ? AND screening.score >= ?
                  AND (screening.score >= ?) <> (screening.score >= ?)) AS changingCount,
              SUM(screening.method_version <> ?) AS otherMethodCount
         ${from} WHERE ${where}`,
      [
        now.suspectedScore,
        tried.suspectedScore,
        now.suspectedScore,
        tried.suspectedScore,
        now.likelyScore,
        tried.likelyScore,
        methodVersion,
        ...values,
      ],
    );
    const count = (name: string) => Number(row?.[name] ?? 0);
    return {
      screeningCount: count('screeningCount'),
      flagsNowCount: count('flagsNowCount'),
      flagsThenCount: count('flagsThenCount'),
      changingCount: count('changingCount'),
      otherMethodCount: count('otherMethodCount'),
    };
  }

  /** The screenings whose verdict would change, highest score first. */
  changes(scope: TrialScope, now: VerdictLimits, tried: VerdictLimits): Promise<TrialRow[]> {
    const { where, values } = conditionOf(scope);
    const nextReport = (column: string) => `(SELECT ${column}
        FROM inspection
        JOIN finding ON finding.id = inspection.finding_id
       WHERE finding.bearing_position_id = bearing_position.id AND inspection.report IS NOT NULL
         AND inspection.reported_at >= survey.surveyed_on
       ORDER BY inspection.reported_at, inspection.id LIMIT 1)`;
    return this.db.query<TrialRow[]>(
      `SELECT screening.id AS screeningId, survey.id AS surveyId, survey.surveyed_on AS surveyedOn,
              machine.tag AS machineTag, bearing_position.code AS positionCode,
              bearing_position.name AS positionName, measuring_point.direction,
              screening.score, screening.verdict, screening.decision,
              ${nextReport("JSON_VALUE(inspection.report, '$.outcome')")} AS outcome,
              ${nextReport('inspection.reported_at')} AS reportedAt
         ${from}
        WHERE ${where}
          AND ((screening.score >= ?) <> (screening.score >= ?)
               OR (screening.score >= ?) <> (screening.score >= ?))
        ORDER BY screening.score DESC, screening.id`,
      [...values, now.suspectedScore, tried.suspectedScore, now.likelyScore, tried.likelyScore],
    );
  }
}

const from = `FROM screening
         JOIN waveform ON waveform.id = screening.waveform_id AND waveform.screening_run = screening.run
         JOIN survey ON survey.id = waveform.survey_id
         JOIN measuring_point ON measuring_point.id = waveform.measuring_point_id
         JOIN bearing_position ON bearing_position.id = measuring_point.bearing_position_id
         JOIN machine ON machine.id = bearing_position.machine_id`;

function conditionOf({ siteId, machineKind, exceptKinds }: TrialScope) {
  const parts = ['machine.site_id = ?', 'screening.score IS NOT NULL'];
  const values: (number | string)[] = [siteId];
  if (machineKind !== null) {
    parts.push('machine.kind = ?');
    values.push(machineKind);
  } else if (exceptKinds.length > 0) {
    parts.push(`machine.kind NOT IN (${exceptKinds.map(() => '?').join(', ')})`);
    values.push(...exceptKinds);
  }
  return { where: parts.join(' AND '), values };
}
