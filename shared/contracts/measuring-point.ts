import { z } from 'zod';

export const directions = ['horizontal', 'vertical', 'axial'] as const;
export const direction = z.enum(directions);
export type Direction = z.infer<typeof direction>;

/** The letter that ends a point's name: P-101/M-DE/H. */
export const directionLetter: Readonly<Record<Direction, string>> = {
  horizontal: 'H',
  vertical: 'V',
  axial: 'A',
};

/**
 * The one spelling of a measuring point's name, in files, lists and pages: tag, position code and
 * the direction's letter with strokes between.
 */
export const pointLabel = (machineTag: string, positionCode: string, pointDirection: Direction) =>
  `${machineTag}/${positionCode}/${directionLetter[pointDirection]}`;

export const createMeasuringPointRequest = z.strictObject({ direction });
export type CreateMeasuringPointRequest = z.infer<typeof createMeasuringPointRequest>;

export const measuringPointResponse = z.object({
  id: z.int(),
  bearingPositionId: z.int(),
  direction,
  label: z.string(),
});
export type MeasuringPointResponse = z.infer<typeof measuringPointResponse>;

/** A point as a list offers it for choosing: on routes and when a file is matched. */
export const pointChoice = z.object({
  id: z.int(),
  label: z.string(),
  machineId: z.int(),
  machineTag: z.string(),
  machineName: z.string(),
  positionCode: z.string(),
  positionName: z.string(),
  direction,
  nominalSpeedRpm: z.number().nullable(),
});
export type PointChoice = z.infer<typeof pointChoice>;
export const pointChoicesResponse = z.object({ points: z.array(pointChoice) });
