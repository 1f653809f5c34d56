import { stopRunning } from './run.mjs';
import { faultInWords } from './say.mjs';

/**
 * What must be undone at the end, whichever way the end comes: by Ctrl-C, by another signal, by a
 * fault. Things are undone in the opposite order; what comes in while the end has begun is undone too.
 *
 * @typedef {object} Endings
 * @property {(undo: () => Promise<void> | void) => void} add
 * @property {(code: number) => Promise<void>} end leaves the process
 * @property {() => boolean} begun
 */

/**
 * @param {string} words what a person reads on Ctrl-C
 * @returns {Endings}
 */
export function createEndings(words) {
  /** @type {(() => Promise<void> | void)[]} */
  const undos = [];
  let begun = false;

  const undoAll = async () => {
    for (let undo = undos.pop(); undo !== undefined; undo = undos.pop()) {
      try {
        await undo();
      } catch (error) {
        process.stderr.write(`${faultInWords(error)}\n`);
      }
    }
  };
  const end = async (/** @type {number} */ code) => {
    if (begun) return;
    begun = true;
    await stopRunning();
    await undoAll();
    process.exit(code);
  };
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    process.on(signal, () => {
      if (!begun) process.stdout.write(`\n${words}\n`);
      void end(0);
    });
  }
  // A terminal that is closed takes the output away; the database must be stopped all the same.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

  return { add: (undo) => void undos.push(undo), end, begun: () => begun };
}
