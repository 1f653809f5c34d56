import { labelledSet } from '#fixtures/signals/labelled-set.ts';
import { screenCase } from './case-outcome.ts';
import type { EvaluationTask, TaskAnswers } from './evaluation-tasks.ts';
import { screenNoise, screenSpeedBound, screenWeakFamily } from './noise-checks.ts';
import { segmentSpread } from './segment-check.ts';

/** Does one task, in a worker thread. */
export function runTask(task: EvaluationTask): TaskAnswers[EvaluationTask['kind']] {
  switch (task.kind) {
    case 'machines':
      return Array.from(labelledSet(task), (one) => screenCase(one, task.withFeatures));
    case 'noise':
      return seeds(task).map(screenNoise);
    case 'weak family':
      return seeds(task).map(screenWeakFamily);
    case 'speed bound':
      return seeds(task).map((seed) => screenSpeedBound(seed, task.orders));
    case 'segments':
      return seeds(task).map(segmentSpread);
  }
}

const seeds = ({ first, count }: { first: number; count: number }) =>
  Array.from({ length: count }, (_, index) => first + index);
