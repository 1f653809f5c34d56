import { detectors, type Detector } from '#shared/quantities/detector.ts';
import { parseUnit } from '#shared/quantities/parse-unit.ts';
import { units, type Unit } from '#shared/quantities/quantity.ts';
import { frequencyUnits, type FrequencyUnit } from '#src/charts/frequency-axis.ts';
import { amplitudeScales, type AmplitudeScale } from '#src/charts/amplitude-scale.ts';

/** How a person likes to see spectra. */
export interface PlotSettingsValue {
  frequencyUnit: FrequencyUnit;
  amplitudeScale: AmplitudeScale;
  /** Null for the unit each record was made in. */
  shownUnit: Unit | null;
  detector: Detector;
}

export const usualPlotSettings: PlotSettingsValue = {
  frequencyUnit: 'orders',
  amplitudeScale: 'linear',
  shownUnit: null,
  detector: 'peak',
};

/** The names the settings have in the address. */
export const settingNames = {
  frequencyUnit: 'axis',
  amplitudeScale: 'scale',
  shownUnit: 'unit',
  detector: 'size',
} as const satisfies Record<keyof PlotSettingsValue, string>;

/** In the address, where a blank would be no choice. */
const asRecorded = 'recorded';

export const settingText = (value: string | null): string => value ?? asRecorded;

export interface ReadSettings {
  settings: PlotSettingsValue;
  /** What could not be understood, in sentences. */
  problems: string[];
}

/** Changed settings as the address has them. */
export function settingTexts(changes: Partial<PlotSettingsValue>): Record<string, string> {
  const texts: Record<string, string> = {};
  for (const name of Object.keys(settingNames) as (keyof PlotSettingsValue)[]) {
    const value = changes[name];
    if (value !== undefined) texts[settingNames[name]] = settingText(value);
  }
  return texts;
}

/** Settings from the address or from what a device has kept; what is not there stays as `usual`. */
export function readPlotSettings(
  search: URLSearchParams,
  usual: PlotSettingsValue = usualPlotSettings,
): ReadSettings {
  const problems: string[] = [];
  const read = <Value>(
    name: string,
    what: string,
    otherwise: Value,
    parse: (text: string) => Value | undefined,
  ): Value => {
    const text = search.get(name);
    if (text === null) return otherwise;
    const value = parse(text);
    if (value === undefined) problems.push(`“${text}” is no ${what}.`);
    return value === undefined ? otherwise : value;
  };
  const oneOf =
    <Word extends string>(words: readonly Word[]) =>
    (text: string) =>
      words.find((word) => word === text);
  return {
    settings: {
      frequencyUnit: read(
        settingNames.frequencyUnit,
        'frequency axis',
        usual.frequencyUnit,
        oneOf(frequencyUnits),
      ),
      amplitudeScale: read(
        settingNames.amplitudeScale,
        'amplitude scale',
        usual.amplitudeScale,
        oneOf(amplitudeScales),
      ),
      shownUnit: read<Unit | null>(
        settingNames.shownUnit,
        `unit of vibration; there are ${units.join(', ')}`,
        usual.shownUnit,
        (text) => (text === asRecorded ? null : (parseUnit(text) ?? undefined)),
      ),
      detector: read(
        settingNames.detector,
        'way to state a size',
        usual.detector,
        oneOf(detectors),
      ),
    },
    problems,
  };
}
