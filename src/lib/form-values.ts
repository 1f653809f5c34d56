import { parseDecimal } from './numbers.ts';

/**
 * How typed text becomes a contract's value: an empty field is null ("not known"), a number is read
 * with point or comma, and text that is no number stays text, so that the contract refuses it.
 */
export const asNumber = {
  setValueAs: (typed: unknown) => {
    const value = parseDecimal(typed ?? '');
    return value === undefined ? null : Number.isNaN(value) ? String(typed) : value;
  },
};

/** A choice or one line of text; empty is null. */
export const asTextOrNull = {
  setValueAs: (typed: unknown) => (typed === '' || typed === undefined ? null : typed),
};

/** A choice among ids; empty is null. */
export const asIdOrNull = {
  setValueAs: (typed: unknown) =>
    typed === '' || typed === undefined || typed === null ? null : Number(typed),
};
