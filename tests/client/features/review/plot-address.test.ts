import { describe, expect, it } from 'vitest';
import type { SpectrumCursor } from '#src/charts/spectrum-cursor.ts';
import {
  cursorText,
  readPlotPlaces,
  windowText,
} from '#src/features/review/components/plot-address.ts';
import {
  readPlotSettings,
  settingTexts,
} from '#src/features/review/components/plot-settings-value.ts';

const cursors: SpectrumCursor[] = [
  { kind: 'free', at: 4.98 },
  { kind: 'harmonics', of: 0.333 },
  { kind: 'sidebands', about: 44.1, spacing: 1 },
];

describe('the address of a plot', () => {
  it('brings zoom and cursors back as they were', () => {
    for (const cursor of cursors) {
      const search = new URLSearchParams({
        zoom: windowText({ min: 0.5, max: 6.2 }) ?? '',
        cursor: cursorText(cursor) ?? '',
        time: windowText({ min: 0, max: 0.25 }) ?? '',
      });
      expect(readPlotPlaces(search)).toEqual({
        window: { min: 0.5, max: 6.2 },
        cursor,
        stretchS: { min: 0, max: 0.25 },
        problems: [],
      });
    }
  });

  it('has nothing of a whole without a cursor', () => {
    expect(windowText(null)).toBeUndefined();
    expect(cursorText({ kind: 'free', at: null })).toBeUndefined();
    const untouched = readPlotPlaces(new URLSearchParams());
    expect(untouched).toMatchObject({ window: null, stretchS: null, problems: [] });
  });

  it('takes nothing that is no place', () => {
    const wrong = ['', '-1_4', '4_4', '1', '1_2_3', 'a_b', '1_Infinity'];
    for (const zoom of wrong) {
      const { window, problems } = readPlotPlaces(new URLSearchParams({ zoom }));
      expect({ zoom, window }).toEqual({ zoom, window: null });
      expect(problems).toEqual([`“${zoom}” is no stretch of a spectrum.`]);
    }
    for (const cursor of ['', 'harmonics_0', 'harmonics', 'sidebands_1', 'sidebands_1_-2', '-4']) {
      const read = readPlotPlaces(new URLSearchParams({ cursor }));
      expect(read.cursor).toEqual({ kind: 'free', at: null });
      expect(read.problems).toEqual([`“${cursor}” is no cursor.`]);
    }
  });

  it('brings the settings back, the unit as recorded among them', () => {
    const settings = {
      frequencyUnit: 'cpm',
      amplitudeScale: 'db',
      shownUnit: 'm/s²',
      detector: 'peak-to-peak',
    } as const;
    const search = new URLSearchParams(settingTexts(settings));
    expect(readPlotSettings(search)).toEqual({ settings, problems: [] });
    const recorded = new URLSearchParams(settingTexts({ shownUnit: null }));
    expect(readPlotSettings(recorded, settings).settings.shownUnit).toBeNull();
  });
});
