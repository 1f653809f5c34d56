import type { Verdict } from '#shared/signal/screening-types.ts';
import { StateMark, type MarkShape, type MarkTone } from './state-mark.tsx';

export const verdictWords: Readonly<Record<Verdict, string>> = {
  none: 'No looseness signs',
  suspected: 'Looseness suspected',
  likely: 'Looseness likely',
  retake: 'Retake the measurement',
};

const looks: Readonly<Record<Verdict, { shape: MarkShape; tone: MarkTone }>> = {
  none: { shape: 'sitting', tone: 'faint' },
  suspected: { shape: 'parted', tone: 'evidence' },
  likely: { shape: 'lifted', tone: 'evidence' },
  retake: { shape: 'unseen', tone: 'ink' },
};

export function VerdictMark({ verdict, strong }: { verdict: Verdict; strong?: boolean }) {
  return (
    <StateMark {...looks[verdict]} strong={strong ?? verdict === 'likely'}>
      {verdictWords[verdict]}
    </StateMark>
  );
}
