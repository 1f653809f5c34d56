import type { CaseOutcome } from './case-outcome.ts';
import type { NoiseOutcome, SpeedBoundOutcome } from './noise-checks.ts';

/** A piece of work for a worker thread; the answer comes back with the same index. */
export type EvaluationTask =
  | { kind: 'machines'; seed: number; first: number; machines: number; withFeatures: boolean }
  | { kind: 'noise'; first: number; count: number }
  | { kind: 'weak family'; first: number; count: number }
  | { kind: 'speed bound'; first: number; count: number; orders: number }
  | { kind: 'segments'; first: number; count: number };

/** What a task of each kind gives. */
export interface TaskAnswers {
  machines: CaseOutcome[];
  noise: NoiseOutcome[];
  'weak family': number[];
  'speed bound': SpeedBoundOutcome[];
  segments: (number | null)[];
}
