import { describe, expect, it } from 'vitest';
import { parseUnit } from '#shared/quantities/parse-unit.ts';
import { units } from '#shared/quantities/quantity.ts';

describe('parseUnit', () => {
  it.each([
    ['g', ['g', 'G', ' g ', "g's", 'gs']],
    ['m/s²', ['m/s²', 'm/s2', 'm/s^2', 'm/s**2', 'M/S2', 'm / s²', 'm/sec^2', 'm·s⁻²', 'm s-2']],
    ['mm/s', ['mm/s', 'mm/sec', 'MM/S', 'mm·s⁻¹', 'mm s^-1', 'mm∕s']],
    ['in/s', ['in/s', 'ips', 'IPS', 'inch/s', 'in/sec', 'inches/sec']],
    ['µm', ['um', '\u00b5m', '\u03bcm', 'micron', 'Microns', 'micrometre']],
    ['mil', ['mil', 'mils', 'MILS', 'thou']],
  ])('reads every way of writing %s', (unit, texts) => {
    for (const text of texts) expect(parseUnit(text), text).toBe(unit);
  });

  it('reads each unit as the program itself writes it', () => {
    for (const unit of units) expect(parseUnit(unit)).toBe(unit);
  });

  it.each([
    '',
    'mm',
    'm/s',
    'mm/s²',
    'V',
    'mV',
    'g rms',
    'µm p-p',
    'mm/s pk',
    'counts',
    'm/s3',
    'Hz',
  ])('takes %j for none of the six', (text) => {
    expect(parseUnit(text)).toBeNull();
  });
});
