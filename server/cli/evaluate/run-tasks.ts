import { Piscina } from 'piscina';
import { typescriptWorkerPath } from '#server/screening/worker-pool.ts';
import type { EvaluationTask, TaskAnswers } from './evaluation-tasks.ts';

const threads = 2;

/**
 * Runs tasks of one kind on two threads.
 *
 * @param told - called after each task with how many are done
 * @returns all answers, in the order of the tasks
 */
export async function runTasks<Kind extends EvaluationTask['kind']>(
  tasks: readonly Extract<EvaluationTask, { kind: Kind }>[],
  told: (done: number) => void,
): Promise<TaskAnswers[Kind]> {
  const pool = new Piscina<EvaluationTask, TaskAnswers[Kind]>({
    filename: typescriptWorkerPath,
    workerData: { module: new URL('./evaluation-worker.ts', import.meta.url).href },
    name: 'runTask',
    minThreads: 0,
    maxThreads: threads,
    execArgv: [],
  });
  let done = 0;
  try {
    const answers = await Promise.all(
      tasks.map(async (task) => {
        const answer = await pool.run(task);
        told(++done);
        return answer;
      }),
    );
    return answers.flat() as TaskAnswers[Kind];
  } finally {
    await pool.destroy();
  }
}
