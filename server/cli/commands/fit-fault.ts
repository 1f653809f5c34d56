import { FitInputError } from '#shared/fits/fit-input-error.ts';

/** The error line of the fit commands. */
export interface FaultLine {
  error: { code: string; field: string; message: string };
}

/** Turns a refused input into its line; anything else is a defect and goes on up. */
export function faultLine(error: unknown): FaultLine {
  if (!(error instanceof FitInputError)) throw error;
  return { error: { code: error.code, field: error.field, message: error.message } };
}
