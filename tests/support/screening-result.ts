import type { OrderLine, ScreeningResult } from '#shared/signal/screening-types.ts';

const speedHz = 24.6;

/** A line of the order table that stands out of its floor. */
export const anOrderLine = (order: number, overrides: Partial<OrderLine> = {}): OrderLine => ({
  order,
  frequencyHz: order * speedHz,
  velocityMmPerSRms: 2 / order,
  amplitudePeak: 0.1,
  floorMmPerSRms: 0.02,
  prominenceDb: 24,
  pNoise: 1e-6,
  explainedBy: null,
  ...overrides,
});

/** What the method says of a record with a run of harmonics, unless told otherwise. */
export const aScreeningResult = (overrides: Partial<ScreeningResult> = {}): ScreeningResult => ({
  verdict: 'likely',
  score: 0.82,
  kind: 'seat',
  speed: { speedHz, source: 'refined', intervalHz: [24.58, 24.62], alternatives: [] },
  orders: [1, 2, 3, 4, 5, 6].map((order) => anOrderLine(order)),
  harmonicRun: {
    length: 6,
    from: 1,
    to: 6,
    pChance: 1e-7,
    significantOfFirst10: 6,
    significantOfFirst20: 6,
    slopeDbPerOrder: -2,
    halfOrderCount: 0,
    thirdOrderCount: 0,
  },
  truncation: { side: 'upper', share: 0.2, expectedShare: 0.1, instrument: false, ranges: [] },
  overallVelocity: { mmPerSRms: 4.6, fromHz: 10, toHz: 1000 },
  quality: [],
  evidence: [{ for: true, text: 'Orders 1 to 6 stand out.' }],
  lookAlikes: [{ name: 'misalignment', ruledOut: true, reason: 'The run is too long.' }],
  quantity: 'acceleration',
  revolutions: 60,
  methodVersion: 'test-1',
  limits: { suspectedScore: 0.4, likelyScore: 0.7, minRevolutions: 20, minOrdersInBand: 10 },
  ...overrides,
});
