import type { ScreeningFeatures } from './features.ts';
import type { HarmonicRun, LookAlike, MachineFacts, OrderLine } from './screening-types.ts';

/** Kinds of machines whose process itself puts running-speed families into the spectrum. */
const familyByNature = ['compressor', 'blower', 'mill', 'conveyor'];

const level = (orders: readonly OrderLine[], order: number) =>
  orders.find((line) => line.order === order)?.velocityMmPerSRms ?? 0;

/** What could look like looseness here, and why it was or was not ruled out. */
export function lookAlikes(
  features: ScreeningFeatures,
  run: HarmonicRun,
  orders: readonly OrderLine[],
  machine: MachineFacts | undefined,
): LookAlike[] {
  const found: LookAlike[] = [];
  const add = (name: string, ruledOut: boolean, reason: string) =>
    found.push({ name, ruledOut, reason });
  const [first, second, third] = [1, 2, 3].map((order) => level(orders, order)) as [
    number,
    number,
    number,
  ];
  const high = features.strongHighOrders;
  add(
    'unbalance',
    features.runOverFirst > 0.3,
    `Unbalance gives 1× alone; orders 2 to 10 together are ${Math.round(features.runOverFirst * 100)} % of it here.`,
  );
  add(
    'misalignment or bent shaft',
    high >= 2 || features.fractions >= 2,
    high >= 2
      ? `Misalignment gives orders 1 to 3 and little above; here ${high} of the fourth to tenth are strong.`
      : `2× is ${percentOf(second, first)} and 3× ${percentOf(third, first)} of 1×, with little above: with one sensor that can't be told from an incipient pedestal looseness.`,
  );
  const explained = orders.filter((line) => line.explainedBy !== null && line.pNoise < 1e-3);
  for (const words of new Set(explained.map((line) => line.explainedBy ?? ''))) {
    const lines = explained.filter((line) => line.explainedBy === words);
    add(
      words,
      true,
      `It explains the line at order ${lines.map((line) => line.order).join(', ')}, which is not counted.`,
    );
  }
  add(
    'a bearing defect, a neighbour machine or another source out of step',
    features.strangerDb < -14,
    features.strangerDb < -14
      ? `The strongest line that belongs to no order is ${(-features.strangerDb).toFixed(0)} dB below the strongest order.`
      : `A line that belongs to no order is only ${(-features.strangerDb).toFixed(0)} dB below the strongest order; look for its source first.`,
  );
  add(
    'turbulence or cavitation',
    features.synchronousShare > 0.4,
    `${Math.round(features.synchronousShare * 100)} % of the vibration is synchronous with the shaft; broad-band sources are not.`,
  );
  if (run.length >= 4) {
    const kind = machine?.assetKind;
    add(
      'rub, or a machine whose process gives such families',
      kind !== undefined && !familyByNature.includes(kind),
      kind === undefined
        ? 'What kind of machine it is was not told; reciprocating and rubbing machines show such families too.'
        : familyByNature.includes(kind)
          ? `A ${kind} can show running-speed families by its nature; compare with its own earlier surveys.`
          : `A ${kind} has no such process; a rub would need a contact that the record can't show.`,
    );
  }
  return found;
}

const percentOf = (part: number, whole: number) =>
  whole > 0 ? `${Math.round((part / whole) * 100)} %` : 'more than all';
