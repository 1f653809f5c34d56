import type { ScreeningFeatures } from './features.ts';
import type { EvidenceSentence, HarmonicRun, SpeedReading, Truncation } from './screening-types.ts';

const times = (count: number, one: string, many: string) =>
  count === 1 ? `one ${one}` : `${count} ${many}`;
const percent = (share: number) => `${Math.round(share * 100)} %`;

/** The evidence for and against in sentences with their numbers. */
export function evidenceSentences(
  features: ScreeningFeatures,
  run: HarmonicRun,
  truncation: Truncation,
  speed: SpeedReading,
): EvidenceSentence[] {
  const found: EvidenceSentence[] = [];
  const add = (isFor: boolean, text: string) => found.push({ for: isFor, text });
  const chance = run.pChance < 1e-6 ? 'less than one in a million' : run.pChance.toPrecision(1);
  if (run.length >= 4) {
    add(
      true,
      `Orders ${run.from} to ${run.to} of running speed stand out of their floor without a break (chance by luck ${chance}). A run alone does not prove looseness: sound machines show them too.`,
    );
  } else {
    add(
      false,
      `No long run of running-speed orders: ${run.length === 0 ? 'none stands out' : `the longest is ${run.length}`}.`,
    );
  }
  if (features.strongHighOrders >= 2) {
    add(
      true,
      `${times(features.strongHighOrders, 'order', 'orders')} from the fourth to the tenth ${features.strongHighOrders === 1 ? 'is' : 'are'} at least a tenth as strong as the strongest: the run falls off slowly.`,
    );
  } else if (features.openOrdersOut > 0) {
    add(false, 'The orders fall off fast: above the third none but traces.');
  }
  if (features.runOverFirst >= 0.5) {
    add(true, `Orders 2 to 10 together reach ${percent(features.runOverFirst)} of 1× in velocity.`);
  } else {
    add(
      false,
      `1× rules the family: orders 2 to 10 together reach ${percent(features.runOverFirst)} of it.`,
    );
  }
  if (features.fractions > 0) {
    add(
      true,
      `${times(features.fractions, 'half or third order stands', 'half and third orders stand')} out, which a part that rattles puts there.`,
    );
  }
  if (features.truncated > 0) {
    add(
      true,
      `The averaged revolution dwells ${percent(truncation.share)} of the turn near its ${truncation.side === 'both' ? 'extremes' : `${truncation.side} extreme`}; a sine would ${percent(truncation.expectedShare)}: the motion is stopped by something.`,
    );
  }
  add(
    features.synchronousShare >= 0.55,
    `${percent(features.synchronousShare)} of the vibration up to the twentieth order is synchronous with the shaft.`,
  );
  if (features.strangerDb > -14) {
    add(
      false,
      `A line that belongs to no order stands ${Math.abs(features.strangerDb).toFixed(0)} dB ${features.strangerDb < 0 ? 'below' : 'above'} the strongest order.`,
    );
  }
  if (features.familyMmPerS < 0.6) {
    add(false, `The orders together are weak: ${features.familyMmPerS.toFixed(2)} mm/s rms.`);
  }
  for (const other of speed.alternatives) {
    add(false, `The speed is not beyond doubt: ${other.reason} (${other.speedHz.toFixed(2)} Hz).`);
  }
  return found;
}
