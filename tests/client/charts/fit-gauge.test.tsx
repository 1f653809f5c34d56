import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import {
  drawnFitUm,
  fitWord,
  gaugeRows,
  gaugeScale,
  isLooserThanDrawn,
  yOf,
  type FitGaugeData,
} from '#src/charts/fit-gauge-geometry.ts';
import { FitGauge } from '#src/charts/fit-gauge.tsx';

afterEach(cleanup);

/** 60 k5 in a class Normal bearing: ISO 286-2 and ISO 492 give +2/+15 and −15/0 µm (from memory). */
const shaftSeat: FitGaugeData = {
  seat: 'shaft',
  seatClass: 'k5',
  seatLimitsUm: [2, 15],
  ringLimitsUm: [-15, 0],
};
/** 130 H7 with class Normal: +0/+40 and −18/0 µm (from memory). */
const housingSeat: FitGaugeData = {
  seat: 'housing',
  seatClass: 'H7',
  seatLimitsUm: [0, 40],
  ringLimitsUm: [-18, 0],
};

describe('the fit that two zones allow', () => {
  it('is shaft minus ring bore on the shaft seat', () => {
    expect(drawnFitUm(shaftSeat)).toEqual({ min: 2, mean: 16, max: 30 });
  });

  it('is ring outside minus housing bore on the housing seat', () => {
    expect(drawnFitUm(housingSeat)).toEqual({ min: -58, mean: -29, max: 0 });
  });

  it('is not known while one of the two is not', () => {
    expect(drawnFitUm({ ...shaftSeat, ringLimitsUm: null })).toBeNull();
  });
});

describe('a measured fit', () => {
  it('is called looser only beyond what the drawing allows', () => {
    const measured = (value: number) => ({ ...housingSeat, measuredUm: { value, uncertainty: 2 } });
    expect(isLooserThanDrawn(measured(-57))).toBe(false);
    expect(isLooserThanDrawn(measured(-59))).toBe(true);
  });

  it('can’t be called looser without a drawing', () => {
    const data: FitGaugeData = {
      ...shaftSeat,
      seatLimitsUm: null,
      measuredUm: { value: -90, uncertainty: null },
    };
    expect(isLooserThanDrawn(data)).toBe(false);
  });
});

describe('the gauge’s scale', () => {
  it('holds the zero line, every limit and the whole doubt of a reading', () => {
    const scale = gaugeScale({ ...shaftSeat, measuredUm: { value: -40, uncertainty: 5 } });
    expect(scale.fromUm).toBeLessThan(-50);
    expect(scale.toUm).toBeGreaterThan(30);
    expect(scale.ticksUm).toContain(0);
    expect(scale.ticksUm.length).toBeLessThanOrEqual(7);
  });

  it('draws interference above clearance', () => {
    const scale = gaugeScale(shaftSeat);
    expect(yOf(10, scale, 200)).toBeLessThan(yOf(-10, scale, 200));
    expect(yOf(scale.toUm, scale, 200)).toBe(0);
  });
});

describe('the gauge in words', () => {
  it('says interference and clearance instead of signs', () => {
    expect([12, -7.5, 0].map(fitWord)).toEqual(['12 µm interference', '7.5 µm clearance', '0 µm']);
  });

  it('lists limits, fit, reading and running fit', () => {
    const rows = gaugeRows({
      ...shaftSeat,
      measuredUm: { value: -14, uncertainty: 2 },
      runningUm: { min: -26, mean: -22, max: -18 },
    });
    expect(rows.map((row) => `${row.label}: ${row.text}`)).toEqual([
      'Shaft k5: +2 … +15 µm',
      'Ring bore: −15 … 0 µm',
      'Fit by the drawing: 2 µm interference to 30 µm interference',
      'Measured: 14 µm clearance, ± 4.0 µm, looser than the drawing allows',
      'At running temperature: 26 µm clearance to 18 µm clearance',
    ]);
  });

  it('is read out where the drawing stands, which the keyboard reaches', () => {
    render(<FitGauge title="Shaft seat" data={shaftSeat} />);
    const drawing = screen.getByRole('img', { name: /^Shaft seat\. Shaft k5: \+2 … \+15 µm/u });
    expect(drawing.tabIndex).toBe(0);
  });

  it('says what to do where nothing is on record', () => {
    render(
      <FitGauge
        title="Shaft seat"
        data={{ seat: 'shaft', seatLimitsUm: null, ringLimitsUm: null }}
      />,
    );
    screen.getByText(/A fit record is the first step/u);
    expect(screen.queryByRole('img')).toBeNull();
  });
});
