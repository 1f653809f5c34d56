import { describe, expect, it } from 'vitest';
import { buildMachine, buildPosition } from '#tests/support/factories.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { importStory } from './import-story.ts';

const dataSource = useTestDatabase();

/** A site with a pump P-1: a rolling bearing 6312 at DE, a plain one at NDE. */
async function plant() {
  const story = await importStory(dataSource());
  const machine = await buildMachine(dataSource(), story.site, {
    tag: 'P-1',
    speedMinRpm: 1000,
    speedMaxRpm: 1500,
  });
  await buildPosition(dataSource(), machine, { code: 'DE' });
  await buildPosition(dataSource(), machine, { code: 'NDE', kind: 'plain', designation: null });
  return story;
}

describe('a wrong row of a machine file', () => {
  it.each([
    ['an unknown kind', 'kind', 'P-9,x,pumpe', '"pumpe" is not known', 'pump, fan'],
    ['text for a number', 'kind,power [kW]', 'P-9,x,pump,heavy', '"heavy" is not a number', 'kW'],
    ['a power below all bounds', 'kind,power [kW]', 'P-9,x,pump,-3', 'At least 0.01 kW', 'kW'],
    ['half a blade', 'kind,blades', 'P-9,x,pump,5.5', 'not a whole number', 'whole number'],
    ['a day that is none', 'kind,next planned stop', 'P-9,x,pump,2026-13-01', 'calendar', 'YYYY'],
    ['an owner who is none', 'kind,owner e-mail', 'P-9,x,pump,a@b.example', 'asset owner', 'owner'],
    ['a speed range upside down', 'kind,highest speed [r/min]', 'P-1,x,pump,900', 'below', 'r/min'],
    ['too few cells', 'kind,drive', 'P-9,x,pump', '3 cells, the header 4', 'as many cells'],
    ['too many cells', 'kind', 'P-9,x,pump,4', '4 cells, the header 3', 'as many cells'],
    ['no kind for a new machine', 'kind', 'P-9,x,', 'The cell is empty', 'pump, fan'],
  ])('names %s with column, reason and remedy', async (_what, headers, cells, reason, remedy) => {
    const story = await plant();
    const { id, counts } = await story.dryRun('machines', `tag,name,${headers}\n${cells}\n`);
    expect(counts).toMatchObject({ wrong: 1 });
    const [row] = await story.rows(id, 'wrong');
    expect(row).toMatchObject({ rowNumber: 2, label: cells.slice(0, 3) });
    const column = headers.split(',').at(-1) ?? '';
    const tooMany = cells.split(',').length > headers.split(',').length + 2;
    expect(row?.faults).toMatchObject([{ column: tooMany ? 'column 4' : column }]);
    expect(row?.faults[0]?.reason).toContain(reason);
    expect(row?.faults[0]?.remedy).toContain(remedy);
  });

  it('names a tag that stands twice, however it is spelt', async () => {
    const story = await plant();
    const { id } = await story.dryRun('machines', 'tag,name,kind\nÖ-1,a,pump\nö-1,b,pump\n');
    expect(await story.rows(id)).toMatchObject([
      { fate: 'new' },
      { fate: 'wrong', rowNumber: 3, faults: [{ column: 'tag' }] },
    ]);
  });

  it('names every fault of a row, and the column that a new machine lacks', async () => {
    const story = await plant();
    const { id } = await story.dryRun('machines', 'tag,name,power [kW]\nP-9,,much\n');
    const [row] = await story.rows(id);
    expect(row?.faults.map(({ column }) => column)).toEqual(['power [kW]', 'name', 'kind']);
  });
});

describe('a wrong row of a position file', () => {
  it.each([
    ['a machine that is not there', 'P-7,A,x,6312', '', 'machine tag', 'no machine P-7'],
    ['an unknown designation', 'P-1,A,x,99999', '', 'designation', 'is not in the table'],
    ['a bore against the designation', 'P-1,A,x,6312,65', 'bore d [mm]', 'bore d [mm]', '60 mm'],
    [
      'D smaller than d',
      'P-1,A,x,,90,50',
      'bore d [mm],outside diameter D [mm]',
      'outside diameter D [mm]',
      'greater than the bore',
    ],
    ['a clearance group that is none', 'P-1,A,x,6312,C-3', 'clearance group', '', '"C-3"'],
    [
      'a temperature below absolute zero',
      'P-1,A,x,6312,-300',
      'shaft temperature [°C]',
      'shaft temperature [°C]',
      'At least -100',
    ],
  ])('names %s', async (_what, cells, headers, column, reason) => {
    const story = await plant();
    const header = ['machine tag,position code,name,designation', headers].filter(Boolean).join();
    const { id } = await story.dryRun('positions', `${header}\n${cells}\n`);
    const [row] = await story.rows(id);
    expect(row).toMatchObject({ fate: 'wrong', faults: [{ column: column || headers }] });
    expect(row?.faults[0]?.reason).toContain(reason);
    expect(row?.faults[0]?.remedy).not.toBe('');
  });
});

describe('a wrong row of a fit record file', () => {
  const header =
    'machine tag,position code,seat,recorded on,source,tolerance class,seat diameter [mm]';
  it.each([
    ['an unknown class', 'P-1,DE,shaft,2026-01-15,drawing,z9,', 'tolerance class', 'z9'],
    ['a hole class on a shaft', 'P-1,DE,shaft,2026-01-15,drawing,H7,', 'tolerance class', 'H7'],
    ['inches', 'P-1,DE,shaft,2026-01-15,mounting,,2.3622', 'seat diameter [mm]', 'inches'],
    ['a factor 1000', 'P-1,DE,shaft,2026-01-15,mounting,,0.06', 'seat diameter [mm]', ''],
    ['a factor 1000 again', 'P-1,DE,housing,2026-01-15,mounting,,13000', 'seat diameter [mm]', ''],
    ['a date in the future', 'P-1,DE,shaft,2999-01-01,drawing,k5,', 'recorded on', 'future'],
    ['a seat of a plain bearing', 'P-1,NDE,shaft,2026-01-15,drawing,k5,', 'position code', 'plain'],
    ['nothing recorded', 'P-1,DE,shaft,2026-01-15,drawing,,', 'tolerance class', 'at least'],
    ['no such position', 'P-1,XX,shaft,2026-01-15,drawing,k5,', 'position code', 'XX'],
  ])('names %s', async (_what, cells, column, reason) => {
    const story = await plant();
    const { id } = await story.dryRun('fit-records', `${header}\n${cells}\n`);
    const [row] = await story.rows(id);
    expect(row).toMatchObject({ fate: 'wrong', rowNumber: 2, faults: [{ column }] });
    expect(row?.faults[0]?.reason).toContain(reason);
    expect(row?.faults[0]?.remedy).not.toBe('');
  });

  it('names two records for one seat and date', async () => {
    const story = await plant();
    const one = 'P-1,DE,shaft,2026-01-15,drawing';
    const { id } = await story.dryRun('fit-records', `${header}\n${one},k5,\n${one},m5,\n`);
    const rows = await story.rows(id);
    expect(rows.map(({ fate }) => fate)).toEqual(['new', 'wrong']);
    expect(rows[1]?.faults[0]?.reason).toContain('stands in row 2 already');
  });

  it('refuses to change a record, saying how it differs', async () => {
    const story = await plant();
    const one = 'P-1,DE,shaft,2026-01-15,drawing';
    await story.load('fit-records', `${header}\n${one},k5,60.01\n`);
    const { id } = await story.dryRun('fit-records', `${header}\n${one},k5,60.02\n`);
    const [row] = await story.rows(id);
    expect(row).toMatchObject({ fate: 'wrong', faults: [{ column: 'seat diameter [mm]' }] });
    expect(row?.faults[0]?.reason).toContain('seat diameter [mm] 60.01, here 60.02');
    expect(row?.faults[0]?.remedy).toContain('added, never changed');
  });

  it('adds no record for a seat and date that got one since the dry run', async () => {
    const story = await plant();
    const one = 'P-1,DE,shaft,2026-01-15,drawing';
    const first = await story.dryRun('fit-records', `${header}\n${one},k5,\n`);
    await story.load('fit-records', `${header}\n${one},m5,\n`);
    const stale = await story.apply(first.id);
    expect(stale.status).toBe(409);
    expect(stale.body.error.message).toContain('Row 2 (P-1/DE shaft 2026-01-15)');
  });
});

describe('a wrong row of a point file', () => {
  it.each([
    ['a direction that is none', 'P-1,DE,diagonal', 'direction'],
    ['no such machine', 'P-8,DE,axial', 'machine tag'],
    ['no such position', 'P-1,XX,axial', 'position code'],
  ])('names %s', async (_what, cells, column) => {
    const story = await plant();
    const { id } = await story.dryRun('points', `machine tag,position code,direction\n${cells}\n`);
    expect(await story.rows(id)).toMatchObject([{ fate: 'wrong', faults: [{ column }] }]);
  });
});
