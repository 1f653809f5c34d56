import { readFile } from 'node:fs/promises';
import { z } from 'zod';
import type { MachineFacts } from '#shared/signal/screening-types.ts';
import { ArgumentFault } from './command-arguments.ts';

const speedRpm = z.number().positive().max(1e6);
const ratio = z.number().positive().max(1e4);
const frequencyHz = z.number().positive().max(1e6);
const lengthMm = z.number().positive().max(1e5);

/** What is known of the machine and the position, by the names of MachineFacts. */
const machineFile = z.object({
  assetKind: z.string().trim().min(1).max(200).optional(),
  nominalSpeedRpm: speedRpm.optional(),
  speedMinRpm: speedRpm.optional(),
  speedMaxRpm: speedRpm.optional(),
  lineFrequencyHz: z.number().positive().max(1000).optional(),
  shaftRatio: ratio.optional(),
  otherShaftRatios: z.array(ratio).max(50).optional(),
  bladeCount: z.int().min(1).max(1000).optional(),
  gearTeethCount: z.int().min(1).max(10_000).optional(),
  beltFrequencyHz: frequencyHz.optional(),
  mounting: z.enum(['rigid', 'flexible']).optional(),
  bearing: z
    .object({
      ballCount: z.int().min(3).max(500),
      ballDiameterMm: lengthMm,
      pitchDiameterMm: lengthMm,
      contactAngleDeg: z.number().min(0).max(90),
    })
    .refine((bearing) => bearing.ballDiameterMm < bearing.pitchDiameterMm, {
      message: 'the rolling element is larger than the pitch circle',
      path: ['ballDiameterMm'],
    })
    .optional(),
  direction: z.enum(['horizontal', 'vertical', 'axial']).optional(),
  neighbourSpeedsHz: z.array(frequencyHz).max(50).optional(),
});

/** The comment lines of waveforms write keys_like_this; both ways of writing are taken here. */
function camelCase(key: string): string {
  return key.replace(/_(\w)/gu, (_, letter: string) => letter.toUpperCase());
}

/** Renames keys all the way down; null says "not known", as an absent key does. */
function normalise(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(normalise);
  if (typeof value !== 'object' || value === null) return value;
  const entries = Object.entries(value).filter(([, item]) => item !== null);
  return Object.fromEntries(entries.map(([key, item]) => [camelCase(key), normalise(item)]));
}

/**
 * Reads a machine file.
 *
 * @param warn - told of keys that mean nothing here, which may be misspelt
 * @throws {ArgumentFault} where the file can't be read or a value can't be right
 */
export async function readMachineFile(
  path: string,
  warn: (message: string) => void,
): Promise<MachineFacts> {
  let json: unknown;
  try {
    json = JSON.parse((await readFile(path, 'utf8')).replace(/^\ufeff/u, ''));
  } catch (error) {
    throw new ArgumentFault(`--machine ${path}: ${(error as Error).message}`);
  }
  const facts = normalise(json);
  const parsed = machineFile.safeParse(facts);
  if (!parsed.success) {
    const faults = parsed.error.issues.map(
      ({ path: at, message }) => `${at.join('.')}: ${message}`,
    );
    throw new ArgumentFault(`--machine ${path}: ${faults.join('; ')}`);
  }
  const { speedMinRpm, speedMaxRpm } = parsed.data;
  if (speedMinRpm !== undefined && speedMaxRpm !== undefined && speedMinRpm > speedMaxRpm) {
    throw new ArgumentFault(`--machine ${path}: speedMaxRpm is below speedMinRpm`);
  }
  const unknown = Object.keys(facts as object).filter((key) => !(key in machineFile.shape));
  if (unknown.length > 0) {
    const known = Object.keys(machineFile.shape).join(', ');
    warn(`--machine ${path}: ${unknown.join(', ')} not used; known are ${known}`);
  }
  return parsed.data;
}
