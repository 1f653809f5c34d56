import type { CaseOutcome } from './case-outcome.ts';
import type { Figure, MethodFigures } from '#shared/signal/method-figures.ts';
import {
  calibration,
  calibrationError,
  falseAlarms,
  falseAlarmsOfFaults,
  histogram,
  looseCases,
  operatingPoints,
  percentile,
  predictiveValue,
  recall,
  recallByKind,
  recallBySigns,
  retakes,
  speedErrors,
  tightCases,
  type Share,
} from './measures.ts';
import type { NoiseOutcome, SpeedBoundOutcome } from './noise-checks.ts';
import type { RealOutcome } from './real-recordings.ts';

export interface EvaluationOutcomes {
  cases: readonly CaseOutcome[];
  noise: readonly NoiseOutcome[];
  weakFamilies: readonly number[];
  speedBounds: readonly SpeedBoundOutcome[];
  segments: readonly (number | null)[];
  real: readonly RealOutcome[];
}

const percent = (share: Share | undefined) =>
  share === undefined || share.cases === 0 ? null : (100 * share.hits) / share.cases;
const least = (value: number) => ({ bound: 'at least' as const, value });
const most = (value: number) => ({ bound: 'at most' as const, value });

const shareFigure = (
  id: string,
  name: string,
  share: Share | undefined,
  target: Figure['target'],
): Figure => ({
  id,
  name,
  value: percent(share),
  unit: '%',
  target,
  cases: share?.cases ?? 0,
});

/** @param about - what was run, and when */
export function gatherFigures(
  outcomes: EvaluationOutcomes,
  about: Pick<MethodFigures, 'methodVersion' | 'evaluatedOn' | 'machines' | 'seed'>,
): MethodFigures {
  const { cases, real } = outcomes;
  const [all, strong, incipient] = recall(cases);
  const alarms = falseAlarms(cases);
  const asked = retakes(cases);
  const speed = speedErrors(cases);
  const bins = calibration(cases);
  const timings = cases.map(({ screeningMs }) => screeningMs);
  const withoutSign = cases.filter((one) => one.physicsLeavesSign === false);
  const flagged = ({ verdict }: { verdict: string }) =>
    verdict === 'suspected' || verdict === 'likely';
  const predictive = predictiveValue(
    (percent(all) ?? 0) / 100,
    (percent(alarms[0]) ?? 0) / 100,
    0.01,
  );
  const realTight = real.filter(({ loose }) => !loose);
  const figures: Figure[] = [
    shareFigure('recall', 'looseness found, where physics leaves a sign', all, least(95)),
    shareFigure('recall-strong', 'moderate and severe looseness found', strong, least(99)),
    shareFigure('recall-incipient', 'incipient looseness found', incipient, least(85)),
    shareFigure('false-alarms', 'false alarms on look-alikes', alarms[0], most(0.5)),
    shareFigure(
      'false-alarms-real',
      'false alarms on real recordings without looseness',
      real.length === 0
        ? undefined
        : { name: '', cases: realTight.length, hits: realTight.filter(flagged).length },
      most(3),
    ),
    {
      id: 'predictive-value',
      name: 'flags that are right where 1 % of the points are loose',
      value: 100 * predictive,
      unit: '%',
      target: null,
      cases: looseCases(cases).length + tightCases(cases).length,
    },
    shareFigure('retakes', 'retakes asked for, defective records', asked.defective, least(97)),
    shareFigure('retakes-sound', 'retakes asked for, sound records', asked.sound, most(1)),
    shareFigure('wrong-speed', asked.wrongSpeedMet.name, asked.wrongSpeedMet, null),
    shareFigure(
      'fault-alarms',
      'looseness called on tight machines in defective records',
      falseAlarmsOfFaults(cases),
      null,
    ),
    {
      id: 'speed-error',
      name: 'relative error of the speed where three orders or more show, 95th percentile',
      value: speed.p95 === null ? null : 100 * speed.p95,
      unit: '%',
      target: most(0.05),
      cases: speed.found,
    },
    {
      id: 'speed-found',
      name: 'records that show three orders or more, speed found by lines',
      value: speed.judged === 0 ? null : (100 * speed.found) / speed.judged,
      unit: '%',
      target: null,
      cases: speed.judged,
    },
    {
      id: 'calibration',
      name: 'mean distance of score and share of loose machines',
      value: calibrationError(bins),
      unit: 'score',
      target: most(0.05),
      cases: bins.reduce((sum, bin) => sum + bin.cases, 0),
    },
    ...specialFigures(outcomes),
    {
      id: 'screening-ms',
      name: 'time of one screening in this run, median ms',
      value: percentile(timings, 0.5),
      unit: '',
      target: null,
      cases: timings.length,
    },
  ];
  return {
    ...about,
    waveforms: cases.length,
    figures,
    recallByKind: recallByKind(cases),
    recallBySigns: recallBySigns(cases),
    withoutSign: {
      name: 'loose machines that leave no sign',
      cases: withoutSign.length,
      hits: withoutSign.filter(flagged).length,
    },
    falseAlarms: alarms,
    retakesByFault: asked.byFault,
    calibration: bins,
    histogram: histogram(cases),
    operatingPoints: operatingPoints(cases),
    realRecordings: bySource(real, flagged),
  };
}

function specialFigures(outcomes: EvaluationOutcomes): Figure[] {
  const { noise, weakFamilies, speedBounds, segments } = outcomes;
  const spreads = segments.flatMap((spread) => (spread === null ? [] : [spread]));
  const rms = (orders: number) => {
    const errors = speedBounds.filter((one) => one.orders === orders);
    const square = errors.reduce((sum, one) => sum + one.errorOverBound ** 2, 0);
    return errors.length === 0 ? null : Math.sqrt(square / errors.length);
  };
  const looked = noise.reduce((sum, { orders }) => sum + orders, 0);
  const rare = noise.reduce((sum, { rareOrders }) => sum + rareOrders, 0);
  const bound = (orders: number): Figure => ({
    id: `speed-bound-${orders}`,
    name: `error of the speed over the Cramér–Rao bound, ${orders} order${orders > 1 ? 's' : ''} at 0 dB, rms`,
    value: rms(orders),
    unit: 'ratio',
    target: most(3),
    cases: speedBounds.filter((one) => one.orders === orders).length,
  });
  return [
    {
      id: 'noise-flags',
      name: 'records of noise alone called loose',
      value: noise.filter(({ flagged }) => flagged).length,
      unit: 'count',
      target: most(0),
      cases: noise.length,
    },
    {
      id: 'noise-runs',
      name: 'records of noise alone with a run of stated chance below 1 in 1,000',
      value:
        noise.length === 0
          ? null
          : (100 * noise.filter(({ pChance }) => pChance < 1e-3).length) / noise.length,
      unit: '%',
      target: most(0.1),
      cases: noise.length,
    },
    {
      id: 'noise-orders',
      name: 'orders in noise alone of stated chance below 1 %',
      value: looked === 0 ? null : (100 * rare) / looked,
      unit: '%',
      target: most(1.2),
      cases: looked,
    },
    shareFigure(
      'weak-family',
      'families of six orders at 2.4 dB found at a chance of 1 in 1,000',
      {
        name: '',
        cases: weakFamilies.length,
        hits: weakFamilies.filter((chance) => chance <= 1e-3).length,
      },
      least(50),
    ),
    bound(1),
    bound(6),
    {
      id: 'segments',
      name: 'largest difference of scores of four stretches of a record, 95th percentile',
      value: percentile(spreads, 0.95),
      unit: 'score',
      target: most(0.1),
      cases: spreads.length,
    },
    shareFigure(
      'segments-within',
      'records whose four stretches score within 0.1',
      { name: '', cases: spreads.length, hits: spreads.filter((s) => s <= 0.1).length },
      null,
    ),
  ];
}

function bySource(
  real: readonly RealOutcome[],
  flagged: (one: RealOutcome) => boolean,
): MethodFigures['realRecordings'] {
  const keys = [...new Set(real.map(({ source, loose }) => `${loose ? 1 : 0}${source}`))].sort();
  return keys.map((key) => {
    const loose = key.startsWith('1');
    const source = key.slice(1);
    const cases = real.filter((one) => one.source === source && one.loose === loose);
    return {
      source,
      loose,
      flagged: { name: source, cases: cases.length, hits: cases.filter(flagged).length },
      retakes: cases.filter(({ verdict }) => verdict === 'retake').length,
    };
  });
}
