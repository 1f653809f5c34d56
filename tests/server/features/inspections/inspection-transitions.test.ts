import { describe, expect, it } from 'vitest';
import {
  inspectionActions,
  nextInspectionState,
} from '#server/features/inspections/inspection-transitions.ts';
import { inspectionStates } from '#shared/contracts/inspection.ts';
import { siteRoles } from '#shared/contracts/session.ts';

/** Every step that is allowed, written out; whatever is not here must be refused. */
const allowed: Readonly<Record<string, string>> = {
  'assigned + accept by owner': 'accepted',
  'accepted + report by owner': 'reported',
  'reported + close by lead': 'closed',
  'assigned + cancel by lead': 'cancelled',
  'accepted + cancel by lead': 'cancelled',
  'assigned + reassign by lead': 'assigned',
  'accepted + reassign by lead': 'assigned',
};

describe('the states of an inspection', () => {
  for (const state of inspectionStates) {
    for (const action of inspectionActions) {
      for (const role of siteRoles) {
        const step = `${state} + ${action} by ${role}`;
        const next = allowed[step] ?? null;
        it(`${step} ${next === null ? 'is refused' : `leads to ${next}`}`, () => {
          expect(nextInspectionState(state, action, role)).toBe(next);
        });
      }
    }
  }

  it('knows every step that is written out here', () => {
    const steps = inspectionStates.flatMap((state) =>
      inspectionActions.flatMap((action) =>
        siteRoles.map((role) => `${state} + ${action} by ${role}`),
      ),
    );
    expect(steps).toEqual(expect.arrayContaining(Object.keys(allowed)));
  });
});
