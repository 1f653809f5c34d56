/** The figures of one evaluation: plain numbers, printed, and shown on the method's page. */
export interface Figure {
  id: string;
  name: string;
  /** Null where there was nothing to measure. */
  value: number | null;
  unit: '%' | 'ratio' | 'score' | 'count' | '';
  /** The value is to be at least, or at most, this. */
  target: { bound: 'at least' | 'at most'; value: number } | null;
  cases: number;
}

export interface ShareRow {
  name: string;
  cases: number;
  hits: number;
}

export interface MethodFigures {
  methodVersion: string;
  /** Day of the evaluation, ISO 8601. */
  evaluatedOn: string;
  machines: number;
  waveforms: number;
  seed: number;
  figures: Figure[];
  recallByKind: ShareRow[];
  /** The same by how many of the watched orders the looseness raised. */
  recallBySigns: ShareRow[];
  /** Loose machines whose looseness does not reach the record: share that is flagged all the same. */
  withoutSign: ShareRow;
  falseAlarms: ShareRow[];
  retakesByFault: ShareRow[];
  calibration: { from: number; to: number; cases: number; meanScore: number; looseShare: number }[];
  histogram: { from: number; to: number; loose: number; notLoose: number }[];
  /** What other limits of the score would find and call falsely. */
  operatingPoints: { limit: number; found: ShareRow; falseAlarms: ShareRow }[];
  /** Real recordings by source; empty where none were given. */
  realRecordings: { source: string; loose: boolean; flagged: ShareRow; retakes: number }[];
}

/** Whether a figure reaches its target; null where there is none, or nothing was measured. */
export function meetsTarget({ value, target }: Figure): boolean | null {
  if (value === null || target === null) return null;
  return target.bound === 'at least' ? value >= target.value : value <= target.value;
}
