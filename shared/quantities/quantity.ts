/** What a sensor reports, in the words of ISO 2041. */
export const quantities = ['acceleration', 'velocity', 'displacement'] as const;
export type Quantity = (typeof quantities)[number];

/** The units a waveform may be recorded in; one spelling everywhere (contracts, tables, pages). */
export const units = ['g', 'm/s²', 'mm/s', 'in/s', 'µm', 'mil'] as const;
export type Unit = (typeof units)[number];

/** The quantity each unit measures. */
export const quantityOfUnit: Readonly<Record<Unit, Quantity>> = {
  g: 'acceleration',
  'm/s²': 'acceleration',
  'mm/s': 'velocity',
  'in/s': 'velocity',
  µm: 'displacement',
  mil: 'displacement',
};
