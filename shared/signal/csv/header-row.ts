import { parseUnit } from '../../quantities/parse-unit.ts';
import { quantityOfUnit, type Quantity, type Unit } from '../../quantities/quantity.ts';
import { CsvError, quoteFound } from './csv-error.ts';

/** What a header cell says of its column. */
export interface HeaderCell {
  /** The cell without its unit. */
  name: string;
  /** `index`: a running number of the samples, which says nothing of time. */
  kind: 'time' | 'index' | 'samples' | 'unknown';
  quantity: Quantity | null;
  unit: Unit | null;
  /** What stands in the brackets; null without any. */
  unitText: string | null;
  /** For time: length of the written unit, s; 1 where none is named. */
  timeUnitS: number;
}

const timeUnits: ReadonlyMap<string, number> = new Map([
  ['s', 1],
  ['sec', 1],
  ['secs', 1],
  ['second', 1],
  ['seconds', 1],
  ['ms', 1e-3],
  ['msec', 1e-3],
  ['millisecond', 1e-3],
  ['milliseconds', 1e-3],
  ['us', 1e-6],
  ['µs', 1e-6],
  ['μs', 1e-6],
  ['usec', 1e-6],
  ['microseconds', 1e-6],
  ['ns', 1e-9],
  ['nanoseconds', 1e-9],
  ['min', 60],
]);

const timeName =
  /^(?:time|t|zeit|temps|tiempo|tempo|tid|tijd|czas|x[ _-]?time|elapsed(?:[ _-]time)?|seconds?|secs?|time[ _-]?(?:s|sec|seconds))$/iu;
const indexName =
  /^(?:#|n|i|no\.?|nr\.?|index|idx|sample|samples|sample[ _-]?(?:no\.?|nr\.?|number|index)|count|row|point[ _-]?(?:no\.?|number))$/iu;

const quantityNames: readonly (readonly [RegExp, Quantity])[] = [
  [/\b(?:acceleration|accel|acc)\b/iu, 'acceleration'],
  [/\b(?:velocity|vel)\b/iu, 'velocity'],
  [/\b(?:displacement|displ?)\b/iu, 'displacement'],
];

/**
 * Reads one header cell, e.g. `acceleration [g]`, `velocity (mm/s)`, `time [ms]`.
 *
 * The last pair of brackets or parentheses is the unit where it names one; otherwise the last pair
 * at the end of the cell. A unit that is none of ours is kept as text and left to a person.
 *
 * @throws {CsvError} `contradictory-header` where name and unit say different quantities, where a
 *   time is in no unit of time, or where a bracket is left open: a unit half read is a wrong one
 */
export function readHeaderCell(cell: string, line: number): HeaderCell {
  refuseOpenBracket(cell, line);
  const { name, unitText } = splitUnit(cell);
  const timeUnitS = unitText === null ? undefined : timeUnits.get(unitText.trim().toLowerCase());
  const unit = unitText === null ? null : parseUnit(unitText);
  const named = quantityNames.filter(([pattern]) => pattern.test(name.replace(/_/gu, ' ')));
  const nameQuantity = named.length === 1 ? named[0]![1] : null;

  if (nameQuantity === null && unit === null) {
    const isTime = timeName.test(name) || (timeUnitS !== undefined && !indexName.test(name));
    if (isTime) {
      if (unitText !== null && timeUnitS === undefined) refuseTimeUnit(cell, line);
      return {
        name,
        kind: 'time',
        quantity: null,
        unit: null,
        unitText,
        timeUnitS: timeUnitS ?? 1,
      };
    }
    const kind = indexName.test(name) ? 'index' : 'unknown';
    return { name, kind, quantity: null, unit: null, unitText, timeUnitS: 1 };
  }

  if (nameQuantity !== null && unit !== null && quantityOfUnit[unit] !== nameQuantity) {
    throw new CsvError(
      'contradictory-header',
      line,
      `The header ${quoteFound(cell)} names ${nameQuantity} in a unit of ${quantityOfUnit[unit]}; ` +
        'expected a quantity and a unit that belong together. Correct the header.',
    );
  }
  const quantity = unit !== null ? quantityOfUnit[unit] : nameQuantity;
  return { name, kind: 'samples', quantity, unit, unitText, timeUnitS: 1 };
}

function refuseOpenBracket(cell: string, line: number): void {
  const count = (mark: string) => cell.split(mark).length;
  if (count('[') === count(']') && count('(') === count(')')) return;
  throw new CsvError(
    'contradictory-header',
    line,
    `The header ${quoteFound(cell)} has a bracket without its partner; expected the unit in ` +
      'brackets or parentheses. Correct the header.',
  );
}

function refuseTimeUnit(cell: string, line: number): never {
  throw new CsvError(
    'contradictory-header',
    line,
    `The header ${quoteFound(cell)} names no unit of time; expected s, ms, µs, ns or min. Correct ` +
      'the header, or map the column as ignored and tell the sampling rate.',
  );
}

function splitUnit(cell: string): { name: string; unitText: string | null } {
  const pairs = [...cell.matchAll(/\[([^\][]*)\]|\(([^()]*(?:\([^()]*\)[^()]*)*)\)/gu)];
  const textOf = (pair: RegExpMatchArray) => (pair[1] ?? pair[2] ?? '').trim();
  const known = (pair: RegExpMatchArray) =>
    parseUnit(textOf(pair)) !== null || timeUnits.has(textOf(pair).toLowerCase());
  const last = pairs.at(-1);
  const pair =
    pairs.filter(known).at(-1) ??
    (last !== undefined && last.index + last[0].length === cell.trimEnd().length
      ? last
      : undefined);
  if (pair === undefined) return { name: cell.trim(), unitText: null };
  const name = `${cell.slice(0, pair.index)} ${cell.slice(pair.index + pair[0].length)}`;
  return { name: name.replace(/\s+/gu, ' ').trim(), unitText: textOf(pair) };
}
