import type { Db } from '#server/db/database.ts';
import type { FindingState } from '#shared/contracts/finding.ts';
import type { InspectionOutcome } from '#shared/contracts/inspection.ts';
import type { MachineKind } from '#shared/contracts/machine.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { ReviewDecision } from '#shared/contracts/review.ts';
import type { LoosenessKind, SpeedSource, Verdict } from '#shared/signal/screening-types.ts';
import type { OutcomeCase, OutcomeFlag, OutcomeReport } from './outcome-case.ts';

interface FlagRow {
  findingId: number;
  verdict: Verdict;
  score: number | null;
  kind: LoosenessKind | null;
  speedSource: SpeedSource;
  direction: Direction;
  surveyedOn: string;
  decidedAt: Date;
}

/**
 * Findings of a site with what came of them. Of a screening's result only two words are read, in the
 * database: whole results of years of surveys would be hundreds of megabytes.
 */
export class OutcomesRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** Flagged screenings of each waveform's newest run, by what was decided. */
  async flagCounts(siteId: number): Promise<Map<ReviewDecision | null, number>> {
    const rows = await this.db.query<{ decision: ReviewDecision | null; count: string | number }[]>(
      `SELECT screening.decision, COUNT(*) AS count
         FROM screening
         JOIN waveform ON waveform.id = screening.waveform_id AND waveform.screening_run = screening.run
         JOIN measuring_point ON measuring_point.id = waveform.measuring_point_id
         JOIN bearing_position ON bearing_position.id = measuring_point.bearing_position_id
         JOIN machine ON machine.id = bearing_position.machine_id
        WHERE machine.site_id = ? AND screening.verdict IN ('suspected', 'likely')
        GROUP BY screening.decision`,
      [siteId],
    );
    return new Map(rows.map(({ decision, count }) => [decision, Number(count)]));
  }

  async cases(siteId: number): Promise<OutcomeCase[]> {
    const findings = await this.db.query<
      { id: number; state: FindingState; machineKind: MachineKind; closedAt: Date | null }[]
    >(
      `SELECT finding.id, finding.state, machine.kind AS machineKind,
              IF(finding.state IN ('verified', 'dismissed'),
                 (SELECT MAX(step.changed_at) FROM state_change step
                   WHERE step.finding_id = finding.id AND step.inspection_id IS NULL
                     AND step.to_state = finding.state),
                 NULL) AS closedAt
         FROM finding
         JOIN bearing_position ON bearing_position.id = finding.bearing_position_id
         JOIN machine ON machine.id = bearing_position.machine_id
        WHERE finding.site_id = ?
        ORDER BY finding.id`,
      [siteId],
    );
    const [flags, reports] = await Promise.all([this.flags(siteId), this.reports(siteId)]);
    return findings.map(({ id, ...finding }) => ({
      ...finding,
      findingId: id,
      flags: flags.get(id) ?? [],
      reports: reports.get(id) ?? [],
    }));
  }

  private async flags(siteId: number): Promise<Map<number, OutcomeFlag[]>> {
    const rows = await this.db.query<FlagRow[]>(
      `SELECT link.finding_id AS findingId, screening.verdict, screening.score,
              JSON_VALUE(screening.result, '$.kind') AS kind,
              JSON_VALUE(screening.result, '$.speed.source') AS speedSource,
              measuring_point.direction, survey.surveyed_on AS surveyedOn,
              COALESCE(screening.decided_at, screening.screened_at) AS decidedAt
         FROM finding_screening link
         JOIN finding ON finding.id = link.finding_id
         JOIN screening ON screening.id = link.screening_id
         JOIN waveform ON waveform.id = screening.waveform_id
         JOIN survey ON survey.id = waveform.survey_id
         JOIN measuring_point ON measuring_point.id = waveform.measuring_point_id
        WHERE finding.site_id = ?
        ORDER BY survey.surveyed_on, screening.id`,
      [siteId],
    );
    return grouped(rows);
  }

  private async reports(siteId: number): Promise<Map<number, OutcomeReport[]>> {
    const rows = await this.db.query<
      { findingId: number; outcome: InspectionOutcome; reportedAt: Date }[]
    >(
      `SELECT inspection.finding_id AS findingId,
              JSON_VALUE(inspection.report, '$.outcome') AS outcome,
              inspection.reported_at AS reportedAt
         FROM inspection
         JOIN finding ON finding.id = inspection.finding_id
        WHERE finding.site_id = ? AND inspection.report IS NOT NULL
          AND inspection.reported_at IS NOT NULL
        ORDER BY inspection.reported_at, inspection.id`,
      [siteId],
    );
    return grouped(rows);
  }
}

function grouped<Row extends { findingId: number }>(rows: readonly Row[]): Map<number, Row[]> {
  const groups = new Map<number, Row[]>();
  for (const row of rows) {
    const known = groups.get(row.findingId);
    if (known) known.push(row);
    else groups.set(row.findingId, [row]);
  }
  return groups;
}
