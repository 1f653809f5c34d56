import { z } from 'zod';

/** What an inspection's photographs may be: the same limits in the form and on the server. */
export const photoLimits = {
  fileMaxBytes: 12 * 1024 * 1024,
  maxPerInspection: 20,
  /** Longer edge of what is kept, pixels: enough to read a scale laid beside the seat. */
  keptMaxPx: 2560,
  smallMaxPx: 480,
} as const;

/** Types taken, as a browser's file field names them. */
export const photoTypes = ['image/jpeg', 'image/png', 'image/webp'] as const;

export const photoSizes = ['small', 'full'] as const;
export type PhotoSize = (typeof photoSizes)[number];
export const photoQuery = z.object({ size: z.enum(photoSizes).default('full') });

export const inspectionPhotoResponse = z.object({
  id: z.int(),
  /** As the file was called on the device that sent it. */
  fileName: z.string(),
  widthPx: z.int(),
  heightPx: z.int(),
  addedByName: z.string(),
  addedAt: z.string(),
});
export type InspectionPhotoResponse = z.infer<typeof inspectionPhotoResponse>;
