import { z } from 'zod';
import { numberBetween, paragraph } from './fields.ts';

/** What is looked at on a pedestal, foot or frame before anything is opened. */
export const inPlaceCheckNames = [
  'bolt torque',
  'movement across the joint',
  'soft foot',
  'shims',
  'grout',
  'cracks',
] as const;
export type InPlaceCheckName = (typeof inPlaceCheckNames)[number];

export const inPlaceFindings = ['sound', 'fault', 'not checked'] as const;

/** Unit of a check's reading; null where there is nothing to read off. */
export const inPlaceReadingUnits: Readonly<Record<InPlaceCheckName, string | null>> = {
  'bolt torque': 'N·m',
  'movement across the joint': 'mm/s rms',
  'soft foot': 'mm',
  shims: null,
  grout: null,
  cracks: null,
};

export const inPlaceCheck = z
  .strictObject({
    check: z.enum(inPlaceCheckNames),
    finding: z.enum(inPlaceFindings, 'Say whether it is sound, at fault or was not checked.'),
    /** In the unit of `inPlaceReadingUnits`; of a movement, below the joint. */
    reading: numberBetween(0, 100_000, '').nullable(),
    /** Of a movement, above the joint, mm/s rms. */
    readingAbove: numberBetween(0, 100_000, '').nullable(),
    note: paragraph(500).nullable(),
  })
  .superRefine((told, context) => {
    if (told.reading !== null && inPlaceReadingUnits[told.check] === null) {
      context.addIssue({
        code: 'custom',
        path: ['reading'],
        message: 'There is no reading to it.',
      });
    }
    if (told.readingAbove !== null && told.check !== 'movement across the joint') {
      context.addIssue({
        code: 'custom',
        path: ['readingAbove'],
        message: 'Only a movement is read on both sides of the joint.',
      });
    }
  });
export type InPlaceCheck = z.infer<typeof inPlaceCheck>;
