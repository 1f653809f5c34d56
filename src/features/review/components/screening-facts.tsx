import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import type { WaveformResponse } from '#shared/contracts/waveform.ts';
import { DescriptionList } from '#src/components/description-list.tsx';
import { Figure } from '#src/components/figure.tsx';
import { formatFixed, formatSignificant } from '#src/lib/numbers.ts';
import { kindWords, speedSourceWords } from './review-words.ts';

type Result = ScreeningResponse['result'];

function speedText({ speed }: Result): string | null {
  if (speed.speedHz === null) return null;
  const rpm = formatFixed(speed.speedHz * 60, 1);
  if (speed.intervalHz === null) return rpm;
  const half = ((speed.intervalHz[1] - speed.intervalHz[0]) / 2) * 60;
  return `${rpm} ± ${formatSignificant(half, 2)}`;
}

/** Smaller chances than one in a million are no knowledge: the model of the noise isn't that good. */
const chanceInWords = (chance: number): string =>
  chance < 1e-6 ? 'under 1 in a million' : formatSignificant(chance, 1);

/** The figures behind the verdict: speed, overall level, run, truncation, record. */
export function ScreeningFacts({
  result,
  waveform,
}: {
  result: Result;
  waveform: WaveformResponse | undefined;
}) {
  const { overallVelocity, harmonicRun, truncation } = result;
  return (
    <DescriptionList
      columns={2}
      items={[
        {
          label: 'Shaft speed',
          value: (
            <>
              <Figure value={speedText(result)} unit="r/min" />{' '}
              <span className="text-xs text-ink-faint">
                {speedSourceWords[result.speed.source]}
              </span>
            </>
          ),
        },
        {
          label: overallVelocity
            ? `Overall velocity, ${formatSignificant(overallVelocity.fromHz)}–${formatSignificant(overallVelocity.toHz)} Hz`
            : 'Overall velocity',
          value: (
            <Figure
              value={overallVelocity ? formatSignificant(overallVelocity.mmPerSRms) : null}
              unit="mm/s rms"
            />
          ),
        },
        {
          label: 'Run of harmonics',
          value:
            harmonicRun.length === 0 ? (
              'None'
            ) : (
              <>
                <Figure value={`${harmonicRun.from}× to ${harmonicRun.to}×`} />
                {', by chance '}
                <Figure value={chanceInWords(harmonicRun.pChance)} />
              </>
            ),
        },
        {
          label: 'Truncation',
          value:
            truncation.side === 'none'
              ? 'None'
              : truncation.instrument
                ? 'By the instrument'
                : `${truncation.side === 'both' ? 'Both sides' : `On the ${truncation.side} side`}, ${formatFixed(truncation.share * 100, 0)} % of the turn`,
        },
        { label: 'Signs point to', value: result.kind === null ? null : kindWords[result.kind] },
        {
          label: 'Record',
          value: waveform && (
            <>
              <Figure value={formatSignificant(waveform.durationS)} unit="s" />
              {', '}
              <Figure
                value={result.revolutions === null ? null : formatFixed(result.revolutions, 0)}
                unit="turns"
              />
            </>
          ),
        },
      ]}
    />
  );
}
