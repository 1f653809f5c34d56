import { describe, expect, it } from 'vitest';
import { findingEvents, nextFindingState } from '#server/features/findings/finding-transitions.ts';
import { findingStates } from '#shared/contracts/finding.ts';
import { siteRoles } from '#shared/contracts/session.ts';

/** Every step that is allowed, written out; whatever is not here must be refused. */
const allowed: Readonly<Record<string, string>> = {
  'open + assign by lead': 'inspecting',
  'monitoring + assign by lead': 'inspecting',
  'open + monitor by lead': 'monitoring',
  'monitoring + monitor by lead': 'monitoring',
  'open + dismiss by lead': 'dismissed',
  'monitoring + dismiss by lead': 'dismissed',
  'monitoring + reopen by lead': 'open',
  'repaired + reopen by lead': 'open',
  'verified + reopen by lead': 'open',
  'dismissed + reopen by lead': 'open',
  'repaired + verify by lead': 'verified',
  'inspecting + inspection-repaired by owner': 'repaired',
  'inspecting + inspection-not-loose by owner': 'monitoring',
  'inspecting + inspection-unsettled by owner': 'open',
  'inspecting + inspection-cancelled by lead': 'open',
};

describe('the states of a finding', () => {
  for (const state of findingStates) {
    for (const event of findingEvents) {
      for (const role of siteRoles) {
        const step = `${state} + ${event} by ${role}`;
        const next = allowed[step] ?? null;
        it(`${step} ${next === null ? 'is refused' : `leads to ${next}`}`, () => {
          expect(nextFindingState(state, event, role)).toBe(next);
        });
      }
    }
  }

  it('knows every step that is written out here', () => {
    const steps = findingStates.flatMap((state) =>
      findingEvents.flatMap((event) => siteRoles.map((role) => `${state} + ${event} by ${role}`)),
    );
    expect(steps).toEqual(expect.arrayContaining(Object.keys(allowed)));
  });
});
