import type { Quantity, Unit } from '../quantities/quantity.ts';

/** What the method says of one waveform. Shown as "No looseness signs", "Looseness suspected", … */
export const verdicts = ['none', 'suspected', 'likely', 'retake'] as const;
export type Verdict = (typeof verdicts)[number];

/** Which joint the evidence favours; `undetermined` where the signs do not tell. */
export const loosenessKinds = ['seat', 'pedestal', 'undetermined'] as const;
export type LoosenessKind = (typeof loosenessKinds)[number];

export const speedSources = ['told', 'refined', 'estimated', 'none'] as const;
export type SpeedSource = (typeof speedSources)[number];

/** What is known of the machine and the position a waveform was taken at. All optional: absent means unknown. */
export interface MachineFacts {
  assetKind?: string;
  nominalSpeedRpm?: number;
  speedMinRpm?: number;
  speedMaxRpm?: number;
  lineFrequencyHz?: number;
  /** Speed of this position's shaft over the speed the machine is told to run at. */
  shaftRatio?: number;
  /** Speeds of the machine's other shafts over the told speed. */
  otherShaftRatios?: readonly number[];
  /** Blades or vanes, passing at the speed of this position's shaft. */
  bladeCount?: number;
  gearTeethCount?: number;
  beltFrequencyHz?: number;
  mounting?: 'rigid' | 'flexible';
  /** Rolling element count and pitch geometry where the bearing is known (orders of its defect families). */
  bearing?: {
    ballCount: number;
    ballDiameterMm: number;
    pitchDiameterMm: number;
    contactAngleDeg: number;
  };
  direction?: 'horizontal' | 'vertical' | 'axial';
  /** Speeds of machines standing nearby, Hz, where known. */
  neighbourSpeedsHz?: readonly number[];
}

/** What earlier screenings of the same point found, oldest first. */
export interface EarlierScreening {
  takenAtMs: number;
  score: number;
  /** Velocity of 1× and of the run of orders 2–10 together, mm/s rms. */
  firstOrderMmPerS: number;
  runMmPerS: number;
  overallMmPerS: number;
}

export interface ScreeningInput {
  /** Raw samples in `unit`; NaN marks a gap. Not changed. */
  samples: Float64Array;
  sampleRateHz: number;
  unit: Unit;
  /** Told speed of the machine, r/min; absent where none was told. */
  toldSpeedRpm?: number;
  /** Largest relative error the told speed may have; default 0.03. */
  toldSpeedTolerance?: number;
  /** Range of the recorder in `unit`, where the file says so. */
  fullScale?: number;
  machine?: MachineFacts;
  earlier?: readonly EarlierScreening[];
}

/** Limits of the verdicts; a site may set its own, every screening keeps those it was made with. */
export interface ScreeningLimits {
  /** Score from which looseness is suspected, 0–1. */
  suspectedScore: number;
  /** Score from which looseness is likely, 0–1. */
  likelyScore: number;
  /** Revolutions a record must cover to be judged. */
  minRevolutions: number;
  /** Orders the usable band must cover to be judged. */
  minOrdersInBand: number;
}

export interface SpeedReading {
  /** Speed of the position's shaft, Hz; null where none could be found. */
  speedHz: number | null;
  source: SpeedSource;
  /** 95 % interval, Hz. */
  intervalHz: readonly [number, number] | null;
  /** Readings about as good as the chosen one (half, double, line frequency), with the reason in words. */
  alternatives: readonly { speedHz: number; reason: string }[];
}

export interface OrderLine {
  order: number;
  frequencyHz: number;
  velocityMmPerSRms: number;
  /** Peak amplitude in the recorded quantity and unit. */
  amplitudePeak: number;
  /** Local noise floor, mm/s rms in one line of the spectrum it is compared in. */
  floorMmPerSRms: number;
  /** How far the line stands out of its floor, dB. */
  prominenceDb: number;
  /** Chance that noise alone gives as much, 0–1. */
  pNoise: number;
  /** What else explains the line (line frequency, blade pass …), or null. */
  explainedBy: string | null;
}

export interface HarmonicRun {
  /** Consecutive integer orders that stand out; 0 where there are none. */
  length: number;
  from: number;
  to: number;
  /** Chance of a run as long by luck, 0–1. */
  pChance: number;
  significantOfFirst10: number;
  significantOfFirst20: number;
  /** Slope of the run's amplitudes, dB per order (negative: falling off); null below three orders. */
  slopeDbPerOrder: number | null;
  halfOrderCount: number;
  thirdOrderCount: number;
}

export const truncationSides = ['none', 'upper', 'lower', 'both'] as const;
export interface Truncation {
  side: (typeof truncationSides)[number];
  /** Share of the revolution spent near the extreme, 0–1, and what the unclipped shape would give. */
  share: number;
  expectedShare: number;
  /** True where the instrument, not the machine, flattened the record. */
  instrument: boolean;
  /** Index ranges [from, to) of the samples near the extreme, for marking the plot; at most 400 ranges. */
  ranges: readonly (readonly [number, number])[];
}

export interface QualityDefect {
  code: string;
  /** Whether the defect alone makes the record unfit to be judged. */
  forcesRetake: boolean;
  message: string;
  /** What to set at the retake. */
  advice: string;
}

export interface EvidenceSentence {
  /** True speaks for looseness, false against it. */
  for: boolean;
  text: string;
}

export interface LookAlike {
  /** What could look alike, e.g. "misalignment". */
  name: string;
  ruledOut: boolean;
  reason: string;
}

export interface ScreeningResult {
  verdict: Verdict;
  /** 0–1; null where the record could not be judged. */
  score: number | null;
  kind: LoosenessKind | null;
  speed: SpeedReading;
  orders: readonly OrderLine[];
  harmonicRun: HarmonicRun;
  truncation: Truncation;
  /** Overall velocity, mm/s rms, over the ISO 20816 band; null where the band is not covered. */
  overallVelocity: { mmPerSRms: number; fromHz: number; toHz: number } | null;
  quality: readonly QualityDefect[];
  evidence: readonly EvidenceSentence[];
  lookAlikes: readonly LookAlike[];
  quantity: Quantity;
  revolutions: number | null;
  methodVersion: string;
  limits: ScreeningLimits;
}

/** The plot data computed with a screening; kept beside it, not inside it. */
export interface ScreeningPlots {
  /** Single-sided amplitude spectrum of the whole record, peak, recorded unit; index × stepHz is the frequency. */
  spectrum: { stepHz: number; amplitudePeak: Float32Array };
  /** Velocity averaged over the revolutions, mm/s, one turn in equal steps; null without a speed. */
  averagedRevolution: Float32Array | null;
}

export interface Screening {
  result: ScreeningResult;
  plots: ScreeningPlots;
}
