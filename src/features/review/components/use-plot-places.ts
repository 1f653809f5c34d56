import { useEffect, useLayoutEffect, useRef, useState } from 'react';
import type { Window } from '#src/charts/plot-window.ts';
import { scaledCursor } from '#src/charts/spectrum-cursor.ts';
import { createSpectrumView, type SpectrumView } from '#src/charts/spectrum-view.ts';
import { createStore, type Store } from '#src/charts/store.ts';
import {
  cursorText,
  placeNames,
  readPlotPlaces,
  windowText,
  type PlotPlaces,
} from './plot-address.ts';

/** Zoom and cursor of the plots; they stay when another flag is gone to. */
export interface PlotPlacesState {
  spectrum: SpectrumView;
  /** Stretch of the waveform in sight, s. */
  stretchS: Store<Window | null>;
}

export type AddressChanges = Readonly<Record<string, string | undefined>>;

/** A pointer moves on sixty times a second; the address follows once it rests. */
const restMs = 300;

/** Keeps zoom and cursor in the address, and follows the address where it changes by itself. */
export function usePlotPlaces(
  search: URLSearchParams,
  onAddress: (changes: AddressChanges) => void,
): PlotPlacesState {
  const address = placesOf(search);
  const [state] = useState(() => createState(readPlotPlaces(search)));
  const isWaiting = useRef(false);
  const isFollowing = useRef(false);
  const write = useRef(onAddress);
  useLayoutEffect(() => {
    write.current = onAddress;
  });

  useEffect(() => {
    let timer: number | undefined;
    const onChange = () => {
      if (isFollowing.current) return;
      isWaiting.current = true;
      window.clearTimeout(timer);
      timer = window.setTimeout(() => {
        isWaiting.current = false;
        write.current(textsOf(state));
      }, restMs);
    };
    const stops = storesOf(state).map((store) => store.subscribe(onChange));
    return () => {
      window.clearTimeout(timer);
      for (const stop of stops) stop();
    };
  }, [state]);

  useEffect(() => {
    // An older address is no news while a newer one waits to be written.
    if (isWaiting.current) return;
    isFollowing.current = true;
    setPlaces(state, readPlotPlaces(new URLSearchParams(address)));
    isFollowing.current = false;
  }, [state, address]);
  return state;
}

/** Carries the spectrum's places over to a frequency axis of another unit. */
export function rescalePlaces({ spectrum }: PlotPlacesState, factor: number): void {
  const { window: store, cursor } = spectrum;
  const view = store.get();
  store.set(view && { min: view.min * factor, max: view.max * factor });
  cursor.set(scaledCursor(cursor.get(), factor));
}

function createState(places: PlotPlaces): PlotPlacesState {
  const state = {
    spectrum: createSpectrumView(),
    stretchS: createStore<Window | null>(null),
  };
  setPlaces(state, places);
  return state;
}

const storesOf = ({ spectrum, stretchS }: PlotPlacesState) => [
  spectrum.window,
  spectrum.cursor,
  stretchS,
];

/** What stands already as the address has it stays as it is, finer than an address can say. */
function setPlaces({ spectrum, stretchS }: PlotPlacesState, places: PlotPlaces): void {
  if (windowText(spectrum.window.get()) !== windowText(places.window)) {
    spectrum.window.set(places.window);
  }
  if (cursorText(spectrum.cursor.get()) !== cursorText(places.cursor)) {
    spectrum.cursor.set(places.cursor);
  }
  if (windowText(stretchS.get()) !== windowText(places.stretchS)) stretchS.set(places.stretchS);
}

function textsOf({ spectrum, stretchS }: PlotPlacesState): AddressChanges {
  return {
    [placeNames.window]: windowText(spectrum.window.get()),
    [placeNames.cursor]: cursorText(spectrum.cursor.get()),
    [placeNames.stretchS]: windowText(stretchS.get()),
  };
}

/** The part of an address that says where one looks. */
function placesOf(search: URLSearchParams): string {
  const part = new URLSearchParams();
  for (const name of Object.values(placeNames)) {
    const text = search.get(name);
    if (text !== null) part.set(name, text);
  }
  return part.toString();
}
