import { formatSigned } from '#src/lib/numbers.ts';

export type RangeUm = readonly [lower: number, upper: number];

export interface SpreadUm {
  min: number;
  mean: number;
  max: number;
}

/** All micrometres on the diameter; interference positive, clearance negative. */
export interface FitGaugeData {
  seat: 'shaft' | 'housing';
  /** Limit deviations of shaft or housing bore from the nominal size; null where no class is known. */
  seatLimitsUm: RangeUm | null;
  /** Limit deviations of the ring's bore or outside diameter. */
  ringLimitsUm: RangeUm | null;
  /** Tolerance class as on the drawing, e.g. "k5". */
  seatClass?: string | null;
  /** The fit from the records; drawn where the limits do not give one. */
  interferenceUm?: SpreadUm | null;
  /** The fit from measured diameters, with its standard uncertainty where known. */
  measuredUm?: { value: number; uncertainty: number | null } | null;
  /** The fit at running temperature. */
  runningUm?: SpreadUm | null;
}

/** The fit that the two zones allow: least, mean and greatest interference. */
export function drawnFitUm({
  seat,
  seatLimitsUm,
  ringLimitsUm,
}: Pick<FitGaugeData, 'seat' | 'seatLimitsUm' | 'ringLimitsUm'>): SpreadUm | null {
  if (seatLimitsUm === null || ringLimitsUm === null) return null;
  // Outside part minus inside part: the shaft goes into the ring, the ring into the housing.
  const [inner, outer] =
    seat === 'shaft' ? [seatLimitsUm, ringLimitsUm] : [ringLimitsUm, seatLimitsUm];
  const min = inner[0] - outer[1];
  const max = inner[1] - outer[0];
  return { min, mean: (min + max) / 2, max };
}

/** Whether the measured fit is looser than anything the drawing allows. */
export function isLooserThanDrawn(data: FitGaugeData): boolean {
  const drawn = drawnFitUm(data);
  if (drawn === null || !data.measuredUm) return false;
  return data.measuredUm.value < drawn.min;
}

export interface GaugeScale {
  fromUm: number;
  toUm: number;
  ticksUm: readonly number[];
}

const tickSteps = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];
const wantedTicks = 5;

/** A scale that holds everything known and the zero line, with air above and below. */
export function gaugeScale(data: FitGaugeData): GaugeScale {
  const drawn = drawnFitUm(data);
  const { measuredUm, runningUm, interferenceUm } = data;
  const spread = measuredUm?.uncertainty ? 2 * measuredUm.uncertainty : 0;
  const values = [
    0,
    ...(data.seatLimitsUm ?? []),
    ...(data.ringLimitsUm ?? []),
    ...(drawn
      ? [drawn.min, drawn.max]
      : interferenceUm
        ? [interferenceUm.min, interferenceUm.max]
        : []),
    ...(measuredUm ? [measuredUm.value - spread, measuredUm.value + spread] : []),
    ...(runningUm ? [runningUm.min, runningUm.max] : []),
  ].filter(Number.isFinite);
  const least = Math.min(...values);
  const greatest = Math.max(...values);
  const air = Math.max(2, (greatest - least) * 0.14);
  const fromUm = least - air;
  const toUm = greatest + air;
  const step =
    tickSteps.find((candidate) => (toUm - fromUm) / candidate <= wantedTicks + 1) ??
    Math.ceil((toUm - fromUm) / wantedTicks);
  const ticksUm: number[] = [];
  for (let tick = Math.ceil(fromUm / step) * step; tick <= toUm; tick += step) {
    ticksUm.push(tick === 0 ? 0 : tick);
  }
  return { fromUm, toUm, ticksUm };
}

/** Place of a value on a drawing `height` tall whose y goes down. */
export function yOf(valueUm: number, scale: GaugeScale, height: number): number {
  return ((scale.toUm - valueUm) / (scale.toUm - scale.fromUm)) * height;
}

/** "+12 µm", "0 µm", "−3.5 µm": whole micrometres where they are whole. */
export function umText(valueUm: number): string {
  return `${formatSigned(valueUm, Number.isInteger(valueUm) ? 0 : 1)} µm`;
}

/** "2 µm interference", "5 µm clearance": the word instead of a sign that may be misread. */
export function fitWord(valueUm: number): string {
  if (Math.abs(valueUm) < 0.05) return '0 µm';
  const size = Math.abs(valueUm).toFixed(Number.isInteger(valueUm) ? 0 : 1);
  return `${size} µm ${valueUm > 0 ? 'interference' : 'clearance'}`;
}

export interface GaugeRow {
  key: 'seat' | 'ring' | 'drawn' | 'recorded' | 'measured' | 'running';
  label: string;
  text: string;
}

/** The whole gauge in words, in the order of the drawing. */
export function gaugeRows(data: FitGaugeData): GaugeRow[] {
  const rows: GaugeRow[] = [];
  const add = (key: GaugeRow['key'], label: string, text: string) =>
    rows.push({ key, label, text });
  const part = data.seat === 'shaft' ? 'Shaft' : 'Housing bore';
  const ring = data.seat === 'shaft' ? 'Ring bore' : 'Ring outside';
  if (data.seatLimitsUm) {
    const name = data.seatClass ? `${part} ${data.seatClass}` : part;
    add('seat', name, limitsText(data.seatLimitsUm));
  }
  if (data.ringLimitsUm) add('ring', ring, limitsText(data.ringLimitsUm));
  const drawn = drawnFitUm(data);
  if (drawn) add('drawn', 'Fit by the drawing', spreadText(drawn));
  else if (data.interferenceUm) add('recorded', 'Recorded fit', spreadText(data.interferenceUm));
  if (data.measuredUm) {
    const { value, uncertainty } = data.measuredUm;
    const doubt = uncertainty === null ? '' : `, ± ${(2 * uncertainty).toFixed(1)} µm`;
    const judgement = isLooserThanDrawn(data) ? ', looser than the drawing allows' : '';
    add('measured', 'Measured', `${fitWord(value)}${doubt}${judgement}`);
  }
  if (data.runningUm) add('running', 'At running temperature', spreadText(data.runningUm));
  return rows;
}

function limitsText([lower, upper]: RangeUm): string {
  return `${formatSigned(lower, digitsOf(lower))} … ${umText(upper)}`;
}

function spreadText({ min, max }: SpreadUm): string {
  return `${fitWord(min)} to ${fitWord(max)}`;
}

function digitsOf(value: number): number {
  return Number.isInteger(value) ? 0 : 1;
}
