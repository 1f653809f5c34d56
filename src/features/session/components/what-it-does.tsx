import type { OrderMark } from '#src/charts/order-mark.ts';
import { OrderStrip } from '#src/charts/order-strip.tsx';

const orders = [1 / 3, 1 / 2, 2 / 3, ...Array.from({ length: 20 }, (_, index) => index + 1)];

const drawn = (prominenceDb: (order: number) => number): OrderMark[] =>
  orders.map((order) => ({
    order,
    prominenceDb: prominenceDb(order),
    significant: prominenceDb(order) > 9,
    explainedBy: null,
  }));

/** Unbalance alone: one line and its traces. */
const tight = drawn((order) => (order === 1 ? 34 : order === 2 ? 11 : 3));
/** A ring rattling in its housing: a run that falls off slowly, with a half order. */
const loose = drawn((order) =>
  order < 1 ? (order === 1 / 2 ? 12 : 3) : Math.max(4, 36 - 1.7 * order),
);

const steps = [
  ['Survey', 'the route’s waveforms, matched to their points'],
  ['Review', 'flags with their evidence, for and against'],
  ['Finding', 'the seats that can explain it'],
  ['Inspection', 'micrometer, limits and cautions'],
  ['Verification', 'the next survey proves the repair'],
] as const;

/** The idea in two strips and five words, for who meets the program for the first time. */
export function WhatItDoes() {
  return (
    <div className="flex flex-col gap-6">
      <figure className="border border-hairline bg-sheet p-4">
        <div className="grid gap-4">
          <div>
            <p className="lettering mb-1 text-ink-faint">A tight fit, a little unbalance</p>
            <OrderStrip size="large" marks={tight} />
          </div>
          <div>
            <p className="lettering mb-1 text-ink-faint">A ring loose in its housing</p>
            <OrderStrip size="large" marks={loose} />
          </div>
        </div>
        <figcaption className="mt-3 text-xs text-ink-faint">
          Each cell is an order of running speed, filled by how far its line stands out of the
          floor. Drawn for illustration, not measured.
        </figcaption>
      </figure>
      <ol className="grid gap-x-4 gap-y-2 phone:grid-cols-5">
        {steps.map(([name, words], index) => (
          <li key={name} className="border-t border-ink pt-1.5">
            <p className="text-sm font-semibold">
              <span className="figures text-ink-faint">{index + 1}</span> {name}
            </p>
            <p className="text-xs text-ink-soft">{words}</p>
          </li>
        ))}
      </ol>
    </div>
  );
}
