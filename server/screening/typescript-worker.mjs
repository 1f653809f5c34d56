// What a worker thread starts with. Node's `--import tsx` does not hold in worker threads (files
// imported later come untranslated), so the thread registers the loader itself before anything else.
import { workerData } from 'piscina';
import { register } from 'tsx/esm/api';

register();
const { runTask: run } = await import(workerData.module);

/** @param {unknown} task @returns {Promise<unknown>} */
export const runTask = (task) => run(task);
