/** A fault a person can do something about: printed as it is, without a stack. */
export class SetupError extends Error {}

/**
 * Prints one line a step with the time it took, so that nobody stares at silence.
 *
 * @template T
 * @param {string} name
 * @param {() => Promise<T> | T} work
 * @param {(result: T) => string} [remark] what came of it, in a few words
 * @returns {Promise<T>}
 */
export async function step(name, work, remark = () => '') {
  process.stdout.write(`${name} …\n`);
  const begun = performance.now();
  const result = await work();
  const seconds = ((performance.now() - begun) / 1000).toFixed(1);
  const words = remark(result);
  process.stdout.write(`  done in ${seconds} s${words === '' ? '' : ` (${words})`}\n`);
  return result;
}

/**
 * Turns what went wrong into a sentence that says what to do.
 *
 * @param {unknown} error
 * @returns {string}
 */
export function faultInWords(error) {
  if (error instanceof SetupError) return error.message;
  const code = /** @type {{ code?: string }} */ (error)?.code;
  const path = /** @type {{ path?: string }} */ (error)?.path ?? 'the project folder';
  if (code === 'ENOSPC') return `The disk is full: free some space, then start again (${path}).`;
  if (code === 'EACCES' || code === 'EPERM') {
    return `This user may not write ${path}. Run as the folder's owner, or change its owner.`;
  }
  if (code === 'EROFS') return `${path} lies on a read-only file system; move the project.`;
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
