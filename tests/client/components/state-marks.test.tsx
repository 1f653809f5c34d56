import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { VerdictMark } from '#src/components/verdict-mark.tsx';
import { FindingStateMark, InspectionStateMark } from '#src/components/work-state-mark.tsx';
import { findingStates } from '#shared/contracts/finding.ts';
import { inspectionStates } from '#shared/contracts/inspection.ts';
import { verdicts } from '#shared/signal/screening-types.ts';

afterEach(cleanup);

function shapes(container: HTMLElement): string[] {
  return Array.from(container.querySelectorAll('svg'), (svg) => svg.innerHTML);
}

describe('state marks', () => {
  it('give every verdict a word and a shape of its own', () => {
    const { container } = render(verdicts.map((v) => <VerdictMark key={v} verdict={v} />));
    for (const word of [
      'No looseness signs',
      'Looseness suspected',
      'Looseness likely',
      'Retake the measurement',
    ]) {
      screen.getByText(word);
    }
    expect(new Set(shapes(container)).size).toBe(verdicts.length);
  });

  it('give every state of a finding a shape of its own', () => {
    const { container } = render(findingStates.map((s) => <FindingStateMark key={s} state={s} />));
    expect(new Set(shapes(container)).size).toBe(findingStates.length);
  });

  it('give every state of an inspection a shape of its own', () => {
    const { container } = render(
      inspectionStates.map((s) => <InspectionStateMark key={s} state={s} />),
    );
    expect(new Set(shapes(container)).size).toBe(inspectionStates.length);
  });
});
