import {
  readPlotSettings,
  settingTexts,
  usualPlotSettings,
  type PlotSettingsValue,
} from './plot-settings-value.ts';

const storageKey = (personId: number) => `fretline-plots-${personId}`;

/** The settings a person chose last on this device; storage that is full or off has none. */
export function preferredPlotSettings(personId: number): PlotSettingsValue {
  try {
    const kept = new URLSearchParams(localStorage.getItem(storageKey(personId)) ?? '');
    return readPlotSettings(kept).settings;
  } catch {
    return usualPlotSettings;
  }
}

export function keepPlotSettings(personId: number, settings: PlotSettingsValue): void {
  try {
    localStorage.setItem(
      storageKey(personId),
      new URLSearchParams(settingTexts(settings)).toString(),
    );
  } catch {
    // The address still holds the choice.
  }
}
