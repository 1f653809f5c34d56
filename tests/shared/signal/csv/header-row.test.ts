import { describe, expect, it } from 'vitest';
import { readHeaderCell } from '#shared/signal/csv/header-row.ts';

describe('readHeaderCell', () => {
  it.each([
    ['acceleration [g]', 'acceleration', 'g', 'acceleration'],
    ['Velocity (mm/s)', 'Velocity', 'mm/s', 'velocity'],
    ['displacement [um]', 'displacement', 'µm', 'displacement'],
    ['Pump 1H Acc (X) [m/s^2]', 'Pump 1H Acc (X)', 'm/s²', 'acceleration'],
    ['vel[ips]', 'vel', 'in/s', 'velocity'],
    ['Schwinggeschwindigkeit (mm/s) DE', 'Schwinggeschwindigkeit DE', 'mm/s', 'velocity'],
    ['[g]', '', 'g', 'acceleration'],
  ])('reads %j as samples', (cell, name, unit, quantity) => {
    expect(readHeaderCell(cell, 1)).toMatchObject({ kind: 'samples', name, unit, quantity });
  });

  it.each([
    ['time [s]', 1],
    ['Time', 1],
    ['t (ms)', 1e-3],
    ['Zeit [µs]', 1e-6],
    ['time [min]', 60],
    ['elapsed [ns]', 1e-9],
    ['X [ms]', 1e-3],
    ['seconds', 1],
  ])('reads %j as a time', (cell, timeUnitS) => {
    expect(readHeaderCell(cell, 1)).toMatchObject({ kind: 'time', timeUnitS });
  });

  it.each(['sample', 'Index', 'No.', '#', 'n', 'Sample number'])(
    'reads %j as a running number, not as a time',
    (cell) => {
      expect(readHeaderCell(cell, 1).kind).toBe('index');
    },
  );

  it.each([
    ['acceleration [V]', 'acceleration', 'V'],
    ['signal [counts]', null, 'counts'],
    ['acceleration [g rms]', 'acceleration', 'g rms'],
    ['bearing 3', null, null],
  ])('keeps what %j says and leaves its unit to a person', (cell, quantity, unitText) => {
    expect(readHeaderCell(cell, 1)).toMatchObject({ unit: null, quantity, unitText });
  });

  it('refuses a name and a unit of different quantities, on its line', () => {
    expect(() => readHeaderCell('velocity [g]', 4)).toThrow(
      expect.objectContaining({ code: 'contradictory-header', line: 4 }),
    );
  });
});
