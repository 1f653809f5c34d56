import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { parseUnit } from '#shared/quantities/parse-unit.ts';
import type { Unit } from '#shared/quantities/quantity.ts';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import type { ScreeningInput, Verdict } from '#shared/signal/screening-types.ts';
import { extractFeatures } from '#shared/signal/analyse-waveform.ts';
import type { FeatureValues } from './case-features.ts';

/** What the evaluation reads of one entry of the folder's index.json. */
interface IndexEntry {
  file: string;
  source: string;
  label: string;
  looseness: boolean;
  speed_rpm: number | null;
  sample_rate_hz: number;
  unit: string;
}

export interface RealOutcome {
  file: string;
  source: string;
  label: string;
  loose: boolean;
  verdict: Verdict;
  score: number | null;
  features: FeatureValues | null;
}

/** Screens the recordings a folder's index.json lists; nothing of them is kept but the outcomes. */
export async function screenRealRecordings(folder: string): Promise<RealOutcome[]> {
  const index = JSON.parse(await readFile(join(folder, 'index.json'), 'utf8')) as IndexEntry[];
  const outcomes: RealOutcome[] = [];
  for (const entry of index) {
    // Where nobody states the unit, m/s² is taken: it scales the levels and nothing else.
    const unit: Unit = parseUnit(entry.unit) ?? 'm/s²';
    const csv = readWaveformCsv(await readFile(join(folder, entry.file)), {
      sampleRateHz: entry.sample_rate_hz,
    });
    const channel = csv.channels[0]!;
    const input: ScreeningInput = {
      samples: channel.samples,
      sampleRateHz: entry.sample_rate_hz,
      unit: channel.unit ?? unit,
      toldSpeedRpm: entry.speed_rpm ?? undefined,
    };
    const { result } = screenWaveform(input);
    outcomes.push({
      file: entry.file,
      source: entry.source,
      label: entry.label,
      loose: entry.looseness,
      verdict: result.verdict,
      score: result.score,
      features: result.score === null ? null : extractFeatures(input),
    });
  }
  return outcomes;
}
