import type { SitePrincipal } from '#server/auth/principal.ts';
import { AppError } from '#server/http/app-error.ts';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import { orderCellsOf } from '#shared/contracts/order-cells.ts';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import type { WaveformListItem } from '#shared/contracts/waveform.ts';
import { convertUnit, unitsLike } from '#shared/quantities/convert-unit.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import { quantityOfUnit, type Unit } from '#shared/quantities/quantity.ts';
import { velocityLines } from '#shared/signal/velocity-lines.ts';
import type { ShownScreening } from './finding-paper.ts';
import type { SpectrumData } from './spectrum-drawing.ts';
import type { TimeData } from './time-drawing.ts';

/** Reading a screening and its plots, as the person may see them. */
export interface ScreeningReader {
  screening: (principal: SitePrincipal, screeningId: number) => Promise<ScreeningResponse>;
  waveform: (principal: SitePrincipal, waveformId: number) => Promise<WaveformListItem>;
  plot: (
    principal: SitePrincipal,
    screeningId: number,
    plot: 'spectrum' | 'averaged-revolution',
  ) => Promise<Buffer>;
  /** Little-endian 32-bit floats in the recorded unit, piece by piece. */
  samples: (principal: SitePrincipal, waveformId: number) => Promise<AsyncIterable<Buffer>>;
}

/** Turns of the shaft shown of a record: enough to see a pattern repeat, few enough to see its shape. */
const shownTurns = 12;
const shownSWithoutSpeed = 0.5;

/** The screening with the highest score, the newer one where two score the same. */
function clearestOf({ screenings }: FindingResponse) {
  let clearest = screenings[0];
  for (const one of screenings) {
    if ((one.score ?? -1) >= (clearest?.score ?? -1)) clearest = one;
  }
  return clearest;
}

/** What the paper of a finding shows of its clearest screening; null where it has none. */
export async function readShownScreening(
  reader: ScreeningReader,
  principal: SitePrincipal,
  finding: FindingResponse,
): Promise<ShownScreening | null> {
  const clearest = clearestOf(finding);
  if (clearest === undefined) return null;
  const { screeningId, waveformId, pointLabel, surveyedOn } = clearest;
  const [screening, waveform] = await Promise.all([
    reader.screening(principal, screeningId),
    reader.waveform(principal, waveformId),
  ]);
  const [spectrum, revolution, record] = await Promise.all([
    whereKept(reader.plot(principal, screeningId, 'spectrum')),
    whereKept(reader.plot(principal, screeningId, 'averaged-revolution')),
    whereKept(readRecord(reader, principal, waveform, screening.result)),
  ]);
  return {
    screening,
    pointLabel,
    surveyedOn,
    spectrum: spectrum === null ? null : spectrumData(spectrum, waveform.unit, screening.result),
    times: [
      ...(record === null ? [] : [record]),
      ...(revolution === null ? [] : [revolutionData(revolution)]),
    ],
  };
}

/** Plots and samples may have been cleared away: the paper then says so instead of failing. */
async function whereKept<T>(reading: Promise<T>): Promise<T | null> {
  try {
    return await reading;
  } catch (error) {
    if (error instanceof AppError && error.code === 'not_found') return null;
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return null;
    throw error;
  }
}

function float32Of(bytes: Buffer): Float32Array {
  const values = new Float32Array(Math.floor(bytes.length / 4));
  for (let i = 0; i < values.length; i += 1) values[i] = bytes.readFloatLE(4 * i);
  return values;
}

/** The kept spectrum (its step, then the lines as peaks in the recorded unit) as velocity. */
function spectrumData(
  bytes: Buffer,
  unit: Unit,
  result: ScreeningResponse['result'],
): SpectrumData | null {
  const [stepHz = 0, ...lines] = float32Of(bytes);
  if (!(stepHz > 0) || lines.length < 2) return null;
  const metric = unitsLike(unit)[0] ?? unit;
  const toMetric = convertUnit(1, unit, metric);
  return {
    stepHz,
    velocityMmPerSRms: velocityLines(
      Float64Array.from(lines, (line) => line * toMetric),
      stepHz,
      quantityOfUnit[unit],
    ),
    speedHz: result.speed.speedHz,
    orders: orderCellsOf(result.orders),
    run: result.harmonicRun,
  };
}

function revolutionData(bytes: Buffer): TimeData {
  const turn = float32Of(bytes);
  return {
    title: 'One averaged revolution, velocity, mm/s',
    // A turn ends where it began.
    samples: Float32Array.from([...turn, turn[0] ?? Number.NaN]),
    span: 360,
    spanUnit: '°',
  };
}

async function readRecord(
  reader: ScreeningReader,
  principal: SitePrincipal,
  waveform: WaveformListItem,
  result: ScreeningResponse['result'],
): Promise<TimeData> {
  const { speedHz } = result.speed;
  const wantedS = speedHz === null ? shownSWithoutSpeed : shownTurns / speedHz;
  const wanted = Math.min(waveform.sampleCount, Math.ceil(wantedS * waveform.sampleRateHz));
  const pieces: Buffer[] = [];
  let bytes = 0;
  for await (const piece of await reader.samples(principal, waveform.id)) {
    pieces.push(piece);
    bytes += piece.length;
    if (bytes >= wanted * 4) break;
  }
  const samples = float32Of(Buffer.concat(pieces).subarray(0, wanted * 4));
  const shownS = samples.length / waveform.sampleRateHz;
  const turns = speedHz === null ? '' : `, first ${formatFixed(shownS * speedHz, 0)} revolutions`;
  const { truncation } = result;
  const truncated =
    truncation.side === 'none'
      ? []
      : truncation.ranges
          .filter(([from]) => from < samples.length)
          .map(([from, to]) => [from, Math.min(to, samples.length)] as const);
  return {
    title: `Waveform, ${waveform.unit}${turns}${truncated.length === 0 ? '' : '; truncated parts in vermilion'}`,
    samples,
    span: shownS,
    spanUnit: 's',
    truncated,
  };
}
