import type { OrderMark } from './order-mark.ts';
import { AlignedOrderStrip } from './order-strip.tsx';
import { windowWithin, type Window } from './plot-window.ts';
import type { PlotPlace } from './spectrum-options.ts';
import { useStore, type Store } from './store.ts';

/** The order strip in line with the spectrum above it, whatever part of that is in sight. */
export function SpectrumStrip({
  place,
  orders,
  run,
  turn,
  whole,
  window,
}: {
  place: PlotPlace;
  orders: readonly OrderMark[];
  run: { from: number; to: number; length: number } | null;
  /** One order on the x axis. */
  turn: number;
  whole: Window;
  window: Store<Window | null>;
}) {
  const { min, max } = windowWithin(useStore(window), whole);
  return (
    <div style={{ paddingLeft: `${place.leftPx}px` }}>
      <AlignedOrderStrip
        marks={orders}
        fromOrder={min / turn}
        toOrder={max / turn}
        widthPx={place.widthPx}
        run={run}
      />
    </div>
  );
}
