import { describe, expect, it } from 'vitest';
import { buildMachine, buildMember, buildPosition, buildSite } from '#tests/support/factories.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();

async function plant() {
  const site = await buildSite(dataSource());
  const lead = await buildMember(dataSource(), site, 'lead');
  const owner = await buildMember(dataSource(), site, 'owner');
  const { as } = buildTestApp(dataSource());
  return { site, lead, owner, as, path: `/api/sites/${site.id}` };
}

describe('the machine list', () => {
  it('sorts, searches and pages on the server', async () => {
    const { site, lead, as, path } = await plant();
    for (const tag of ['P-300', 'P-100', 'F-200']) await buildMachine(dataSource(), site, { tag });
    const page = await as(lead).get(`${path}/machines?sort=tag&direction=desc&pageSize=2`);
    expect(page.body).toMatchObject({ total: 3, items: [{ tag: 'P-300' }, { tag: 'P-100' }] });
    const found = await as(lead).get(`${path}/machines?search=F-2`);
    expect(found.body.items).toHaveLength(1);
  });

  it('takes the wildcards of a search text for themselves', async () => {
    const { site, lead, as, path } = await plant();
    await buildMachine(dataSource(), site, { tag: 'P-100' });
    const found = await as(lead).get(`${path}/machines?search=${encodeURIComponent('%')}`);
    expect(found.body.total).toBe(0);
  });

  it('shows an asset owner the owned machines alone', async () => {
    const { site, owner, as, path } = await plant();
    const own = await buildMachine(dataSource(), site, { ownerUserId: owner.id });
    const other = await buildMachine(dataSource(), site);
    const list = await as(owner).get(`${path}/machines`);
    expect(list.body.items.map((item: { id: number }) => item.id)).toEqual([own.id]);
    expect((await as(owner).get(`${path}/machines/${other.id}`)).status).toBe(404);
  });

  it('answers 422 with the field for a query it does not know', async () => {
    const { lead, as, path } = await plant();
    const answer = await as(lead).get(`${path}/machines?pageSize=0`);
    expect(answer.status).toBe(422);
    expect(answer.body.error.fields[0].path).toBe('pageSize');
  });
});

describe('editing a machine', () => {
  it('refuses a tag that is taken, naming the field', async () => {
    const { site, lead, as, path } = await plant();
    await buildMachine(dataSource(), site, { tag: 'P-100' });
    const answer = await as(lead).post(`${path}/machines`, {
      tag: 'P-100',
      name: 'Another',
      kind: 'pump',
    });
    expect(answer.status).toBe(409);
    expect(answer.body.error.fields[0].path).toBe('tag');
  });

  it('tells the second of two editors and keeps the first one’s change', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const change = (name: string) =>
      as(lead).patch(`${path}/machines/${machine.id}`, { name, version: 1 });
    expect((await change('first')).status).toBe(200);
    expect((await change('second')).status).toBe(409);
    const after = await as(lead).get(`${path}/machines/${machine.id}`);
    expect(after.body.name).toBe('first');
  });

  it('clears what is null and leaves what is absent', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site, { powerKw: 55, drive: 'V-belt' });
    const answer = await as(lead).patch(`${path}/machines/${machine.id}`, {
      powerKw: null,
      version: 1,
    });
    expect(answer.body).toMatchObject({ powerKw: null, drive: 'V-belt' });
  });

  it('takes nobody for an owner who is no asset owner of the site', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const answer = await as(lead).patch(`${path}/machines/${machine.id}`, {
      ownerUserId: lead.id,
      version: 1,
    });
    expect(answer.status).toBe(422);
    expect(answer.body.error.fields[0].path).toBe('ownerUserId');
  });
});

const drawing = { seat: 'shaft', recordedOn: '2026-05-04', source: 'drawing' };

describe('fit records', () => {
  it('are added and shown newest first', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const position = await buildPosition(dataSource(), machine);
    const records = `${path}/positions/${position.id}/fit-records`;
    await as(lead).post(records, { ...drawing, toleranceClass: 'k5' });
    const answer = await as(lead).post(records, {
      ...drawing,
      recordedOn: '2026-06-01',
      source: 'mounting',
      seatMeasuredMm: 60.012,
    });
    expect(answer.status).toBe(201);
    expect(answer.body.fitRecords.map((one: { source: string }) => one.source)).toEqual([
      'mounting',
      'drawing',
    ]);
  });

  it.each([
    ['an unknown class', { toleranceClass: 'z9' }, 'toleranceClass'],
    ['a hole class on a shaft', { toleranceClass: 'H7' }, 'toleranceClass'],
    ['a diameter in inches', { seatMeasuredMm: 2.3622 }, 'seatMeasuredMm'],
    ['a date in the future', { toleranceClass: 'k5', recordedOn: '2999-01-01' }, 'recordedOn'],
    ['nothing but a date', {}, 'toleranceClass'],
    ['a negative drive-up', { driveUpMm: -0.5 }, 'driveUpMm'],
    ['a negative loss of clearance', { clearanceReductionUm: -10 }, 'clearanceReductionUm'],
    ['a drive-up on a cylindrical seat', { driveUpMm: 0.5 }, 'driveUpMm'],
    [
      'millimetres taken for inches',
      { seatMeasuredMm: 1524, diameterUnit: 'in' },
      'seatMeasuredMm',
    ],
    [
      'a diameter a thousand times too large',
      { toleranceClass: 'k5', ringMeasuredMm: 60_000 },
      'ringMeasuredMm',
    ],
  ])('refuse %s, naming the field', async (_what, change, field) => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const position = await buildPosition(dataSource(), machine);
    const answer = await as(lead).post(`${path}/positions/${position.id}/fit-records`, {
      ...drawing,
      ...change,
    });
    expect(answer.status).toBe(422);
    expect(answer.body.error.fields[0].path).toBe(field);
  });
});

describe('a second fit record of one seat and date', () => {
  it('is refused at the date, unless it says that it corrects the first', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const position = await buildPosition(dataSource(), machine);
    const records = `${path}/positions/${position.id}/fit-records`;
    await as(lead).post(records, { ...drawing, toleranceClass: 'k5' });
    const second = { ...drawing, toleranceClass: 'm5' };
    const refused = await as(lead).post(records, second);
    expect(refused.status).toBe(409);
    expect(refused.body.error.fields[0]).toMatchObject({
      path: 'recordedOn',
      message: expect.stringMatching(/shaft seat already has a record/) as string,
    });
    const corrected = await as(lead).post(records, { ...second, correctsSameDay: true });
    expect(corrected.status).toBe(201);
    // Nothing is overwritten: both stand, the later word first.
    expect(
      corrected.body.fitRecords.map((one: { toleranceClass: string }) => one.toleranceClass),
    ).toEqual(['m5', 'k5']);
    const other = await as(lead).post(records, {
      ...drawing,
      seat: 'housing',
      toleranceClass: 'H7',
    });
    expect(other.status).toBe(201);
  });

  it('is taken once where two people send it at the same moment', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const position = await buildPosition(dataSource(), machine);
    const send = () =>
      as(lead).post(`${path}/positions/${position.id}/fit-records`, {
        ...drawing,
        toleranceClass: 'k5',
      });
    const answers = await Promise.all([send(), send()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
  });
});

describe('a tapered shaft seat', () => {
  it('keeps a drive-up and refuses diameters, naming the field', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const sleeve = await as(lead).post(`${path}/machines/${machine.id}/positions`, {
      code: 'DE',
      name: 'Drive end',
      designation: '22220',
      shaftSeatForm: 'adapter sleeve',
      seatTaper: '1:12',
      shaftBoreMm: 30,
      housingWallMm: 25,
      radialLoadN: 12_000,
    });
    expect(sleeve.body).toMatchObject({ shaftSeatForm: 'adapter sleeve', housingWallMm: 25 });
    const records = `${path}/positions/${sleeve.body.id}/fit-records`;
    const kept = await as(lead).post(records, {
      ...drawing,
      source: 'mounting',
      driveUpMm: 0.7,
      clearanceReductionUm: 45,
    });
    expect(kept.status).toBe(201);
    expect(kept.body.fitRecords[0]).toMatchObject({ driveUpMm: 0.7, clearanceReductionUm: 45 });
    const refused = await as(lead).post(records, {
      ...drawing,
      recordedOn: '2026-07-01',
      seatMeasuredMm: 100.01,
    });
    expect(refused.status).toBe(422);
    expect(refused.body.error.fields[0].path).toBe('seatMeasuredMm');
  });
});

describe('bearing positions', () => {
  it('refuse a shaft bore as large as the seat', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const answer = await as(lead).post(`${path}/machines/${machine.id}/positions`, {
      code: 'DE',
      name: 'Drive end',
      designation: '6312',
      shaftBoreMm: 60,
    });
    expect(answer.status).toBe(422);
    expect(answer.body.error.fields[0].path).toBe('shaftBoreMm');
  });

  it('refuse sizes that contradict the designation', async () => {
    const { site, lead, as, path } = await plant();
    const machine = await buildMachine(dataSource(), site);
    const answer = await as(lead).post(`${path}/machines/${machine.id}/positions`, {
      code: 'DE',
      name: 'Drive end',
      designation: '6312',
      boreMm: 65,
      outsideMm: 130,
    });
    expect(answer.status).toBe(422);
    expect(answer.body.error.fields[0].path).toBe('boreMm');
  });
});
