import { FitInputError } from '#shared/fits/fit-input-error.ts';
import { limitDeviationsUm } from '#shared/fits/limit-deviations.ts';
import { faultLine } from './fit-fault.ts';

function limitsOf(argument: string): object {
  const match = /^\s*(\S+?)\s*(?:mm)?\s+([A-Za-z]\S*)\s*$/.exec(argument);
  const compact = match ?? /^\s*([\d.]+)([A-Za-z]+\d+)\s*$/.exec(argument);
  if (!compact) {
    throw new FitInputError(
      'unknown_class',
      'class',
      `"${argument}" must be a nominal size in mm and a tolerance class, such as "40 k5".`,
    );
  }
  const size = Number(compact[1]);
  if (!Number.isFinite(size)) {
    throw new FitInputError('not_finite', 'size', `"${compact[1]}" is not a size in mm.`);
  }
  const toleranceClass = compact[2] ?? '';
  const [lowerUm, upperUm] = limitDeviationsUm(size, toleranceClass);
  return { size, class: toleranceClass, lowerUm, upperUm };
}

/**
 * `limits "40 k5" "80 H7" …`: limit deviations by ISO 286, one JSON object a line.
 *
 * @returns exit status: 1 where any argument could not be answered, or none was given
 */
export function run(args: string[]): Promise<number> {
  let status = 0;
  if (args.length === 0) {
    process.stderr.write('Usage: fretline limits "40 k5" "80 H7" …\n');
    status = 1;
  }
  for (const argument of args) {
    let line: object;
    try {
      line = limitsOf(argument);
    } catch (error) {
      line = faultLine(error);
      status = 1;
    }
    process.stdout.write(`${JSON.stringify(line)}\n`);
  }
  return Promise.resolve(status);
}
