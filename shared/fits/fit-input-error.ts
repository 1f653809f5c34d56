/** Every way an input of the fit calculation is refused; the list is closed. */
export const fitFaultCodes = [
  'not_json',
  'not_an_object',
  'unknown_key',
  'wrong_type',
  'not_finite',
  'size_missing',
  'unknown_class',
  'unknown_designation',
  'unknown_value',
  'unknown_clearance_group',
  'out_of_range',
  'size_out_of_range',
  'diameters_swapped',
  'contradiction',
  'below_absolute_zero',
  'negative',
  'measured_in_inches',
  'measured_in_millimetres',
  'factor_1000',
  'far_from_nominal',
] as const;
export type FitFaultCode = (typeof fitFaultCodes)[number];

/** One fault of the input: which field, what is wrong, what was expected. */
export class FitInputError extends RangeError {
  readonly code: FitFaultCode;
  /** Key of the input, with dots inside an object (`temperaturesC.shaft`). */
  readonly field: string;

  constructor(code: FitFaultCode, field: string, message: string) {
    super(message);
    this.name = 'FitInputError';
    this.code = code;
    this.field = field;
  }
}
