import { describe, expect, it } from 'vitest';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { importLimits } from '#shared/contracts/register-import.ts';
import {
  buildMachine,
  buildMember,
  buildPoint,
  buildPosition,
  buildRoute,
  buildSite,
} from '#tests/support/factories.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { importStory } from './import-story.ts';

const dataSource = useTestDatabase();

const machinesCsv = 'tag,name,kind,power [kW]\nP-1,Pump one,pump,30\nP-2,Pump two,pump,7.5\n';
const positionsCsv =
  'machine tag,position code,name,designation,split housing\nP-1,DE,Pump drive end,6312,yes\n';
const recordsCsv =
  'machine tag,position code,seat,recorded on,source,tolerance class\nP-1,DE,shaft,2026-01-15,drawing,k5\n';
const pointsCsv = 'machine tag,position code,direction\nP-1,DE,horizontal\nP-1,DE,axial\n';

describe('importing a register', () => {
  it('writes nothing before it is applied, and then machines, positions, records and points', async () => {
    const story = await importStory(dataSource());
    const dry = await story.dryRun('machines', machinesCsv);
    expect(dry).toMatchObject({
      state: 'ready',
      rowCount: 2,
      rowsRead: 2,
      counts: { new: 2, changed: 0, same: 0, wrong: 0 },
      can: { apply: true, undo: false },
    });
    expect(await story.machines()).toHaveLength(0);
    const applied = await story.apply(dry.id);
    expect(applied.body).toMatchObject({ state: 'applied', can: { apply: false, undo: true } });
    await story.load('positions', positionsCsv);
    await story.load('fit-records', recordsCsv);
    await story.load('points', pointsCsv);
    const [first] = await story.machines();
    const whole = await story.as(story.lead).get(`${story.path}/machines/${first.id}`);
    expect(whole.body).toMatchObject({
      tag: 'P-1',
      powerKw: 30,
      positions: [
        {
          code: 'DE',
          splitHousing: true,
          mustSlide: false,
          fitRecords: [{ seat: 'shaft', toleranceClass: 'k5', recordedByName: story.lead.name }],
          points: [{ label: 'P-1/DE/H' }, { label: 'P-1/DE/A' }],
        },
      ],
    });
  });

  it('tells of a changed row which columns, and writes these alone', async () => {
    const story = await importStory(dataSource());
    const machine = await buildMachine(dataSource(), story.site, {
      tag: 'P-1',
      powerKw: 30,
      drive: 'V-belt',
      criticality: 'high',
    });
    const file = 'tag;power [kW];criticality;owner e-mail\np-1;7,5;;' + story.owner.email;
    const { id } = await story.dryRun('machines', file);
    expect(await story.rows(id)).toMatchObject([
      {
        rowNumber: 2,
        fate: 'changed',
        changes: [
          { column: 'power [kW]', before: '30', after: '7.5' },
          { column: 'owner e-mail', before: '', after: story.owner.email },
        ],
      },
    ]);
    expect((await story.apply(id)).status).toBe(200);
    const after = await story.as(story.lead).get(`${story.path}/machines/${machine.id}`);
    expect(after.body).toMatchObject({
      tag: 'P-1',
      powerKw: 7.5,
      drive: 'V-belt',
      criticality: 'high',
      ownerUserId: story.owner.id,
      version: 2,
    });
  });

  it('writes nothing while one row is wrong', async () => {
    const story = await importStory(dataSource());
    const { id, can } = await story.dryRun('machines', `${machinesCsv}P-3,Pump three,pump,heavy\n`);
    expect(can.apply).toBe(false);
    const refused = await story.apply(id);
    expect(refused.status).toBe(409);
    expect(refused.body.error.message).toContain('1 of the rows are wrong');
    expect(await story.machines()).toHaveLength(0);
  });

  it('writes nothing when a row was changed or taken since the dry run', async () => {
    const story = await importStory(dataSource());
    const machine = await buildMachine(dataSource(), story.site, { tag: 'P-2', name: 'Old' });
    const changing = await story.dryRun('machines', machinesCsv);
    await story
      .as(story.lead)
      .patch(`${story.path}/machines/${machine.id}`, { drive: 'gear', version: 1 });
    const stale = await story.apply(changing.id);
    expect(stale.status).toBe(409);
    expect(stale.body.error.message).toContain('Row 3 (P-2)');
    const adding = await story.dryRun('machines', machinesCsv);
    await buildMachine(dataSource(), story.site, { tag: 'p-1' });
    expect((await story.apply(adding.id)).status).toBe(409);
    expect((await story.machines()).map((one: { name: string }) => one.name)).not.toContain(
      'Pump one',
    );
  });

  it('writes a file once, however often it is asked to', async () => {
    const story = await importStory(dataSource());
    const { id } = await story.dryRun('machines', machinesCsv);
    const answers = await Promise.all([story.apply(id), story.apply(id)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await story.machines()).toHaveLength(2);
  });

  it('and a form at the same time leave one record for a seat and date', async () => {
    const story = await importStory(dataSource());
    await story.load('machines', machinesCsv);
    await story.load('positions', positionsCsv);
    const { id } = await story.dryRun('fit-records', recordsCsv);
    const [machine] = await story.machines();
    const whole = () => story.as(story.lead).get(`${story.path}/machines/${machine.id}`);
    const positionId: number = (await whole()).body.positions[0].id;
    const record = { seat: 'shaft', recordedOn: '2026-01-15', source: 'drawing' };
    const answers = await Promise.all([
      story.apply(id),
      story.as(story.lead).post(`${story.path}/positions/${positionId}/fit-records`, {
        ...record,
        toleranceClass: 'm5',
      }),
    ]);
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(1);
    expect((await whole()).body.positions[0].fitRecords).toHaveLength(1);
  });

  it('keeps every import with its people, newest first', async () => {
    const story = await importStory(dataSource());
    const id = await story.load('machines', machinesCsv);
    await story.undo(id);
    await story.dryRun('machines', machinesCsv);
    const list = await story.as(story.lead).get(story.imports);
    expect(list.body).toMatchObject({
      total: 2,
      items: [
        { state: 'ready', uploadedByName: story.lead.name },
        { state: 'undone', appliedByName: story.lead.name, undoneByName: story.lead.name },
      ],
    });
  });

  it('stays within its site', async () => {
    const story = await importStory(dataSource());
    const other = await buildSite(dataSource());
    await buildMachine(dataSource(), other, { tag: 'P-1' });
    const stranger = await buildMember(dataSource(), other, 'lead');
    const { id, counts } = await story.dryRun('machines', machinesCsv);
    expect(counts.new).toBe(2);
    const elsewhere = `/api/sites/${other.id}/register/imports`;
    expect((await story.as(stranger).get(`${elsewhere}/${id}`)).status).toBe(404);
    expect((await story.as(stranger).post(`${elsewhere}/${id}/apply`)).status).toBe(404);
    const theirs = await story.as(stranger).get(`/api/sites/${other.id}/register/exports/machines`);
    expect(theirs.text.split('\r\n')).toHaveLength(3);
  });
});

describe('undoing an import', () => {
  it('makes the register exactly what it was', async () => {
    const story = await importStory(dataSource());
    await buildMachine(dataSource(), story.site, { tag: 'P-1', name: 'Old', notes: 'a\nb' });
    const before = await story.exported('machines');
    const id = await story.load('machines', machinesCsv);
    expect(await story.exported('machines')).not.toBe(before);
    expect((await story.undo(id)).body).toMatchObject({ state: 'undone', can: { undo: false } });
    expect(await story.exported('machines')).toBe(before);
    expect((await story.undo(id)).status).toBe(409);
  });

  it('is refused, naming the row, when a row was changed since', async () => {
    const story = await importStory(dataSource());
    const id = await story.load('machines', machinesCsv);
    const machine = await dataSource().getRepository(Machine).findOneByOrFail({ tag: 'P-2' });
    await story
      .as(story.lead)
      .patch(`${story.path}/machines/${machine.id}`, { name: 'Mine', version: 1 });
    const refused = await story.undo(id);
    expect(refused.status).toBe(409);
    expect(refused.body.error.message).toContain('Row 3 (P-2): it was changed since.');
    expect(await story.machines()).toHaveLength(2);
  });

  it('is refused when a row was used since, and done once the use is gone', async () => {
    const story = await importStory(dataSource());
    const machines = await story.load('machines', machinesCsv);
    const positions = await story.load('positions', positionsCsv);
    const refused = await story.undo(machines);
    expect(refused.body.error.message).toContain('Row 2 (P-1): it has bearing positions.');
    expect((await story.undo(positions)).status).toBe(200);
    expect((await story.undo(machines)).status).toBe(200);
    expect(await story.machines()).toHaveLength(0);
  });

  it('is refused for a point that a route goes by', async () => {
    const story = await importStory(dataSource());
    const machine = await buildMachine(dataSource(), story.site, { tag: 'P-1' });
    const position = await buildPosition(dataSource(), machine, { code: 'DE' });
    const vertical = await buildPoint(dataSource(), position, 'vertical');
    const id = await story.load('points', pointsCsv);
    const choices = await story.as(story.lead).get(`${story.path}/points`);
    const horizontal = choices.body.points.find(
      (point: { label: string }) => point.label === 'P-1/DE/H',
    );
    await buildRoute(dataSource(), story.site, [vertical, horizontal]);
    const refused = await story.undo(id);
    expect(refused.body.error.message).toContain('Row 2 (P-1/DE/H): a route goes by it.');
  });
});

describe('a register file that is not taken', () => {
  it('is told what is wrong: separator, column, encoding, kind', async () => {
    const story = await importStory(dataSource());
    const refused = await story.send('machines', 'tag|name\nP-1|x\n');
    expect(refused.status).toBe(422);
    expect(refused.body.error.message).toContain('Missing columns: "tag"');
    const workbook = await story.send('machines', Buffer.from([0x50, 0x4b, 3, 4, 0]), 'r.xlsx');
    expect(workbook.status).toBe(422);
    expect(workbook.body.error.message).toContain('workbook');
    const kind = await story.send('pumps', machinesCsv);
    expect(kind.status).toBe(422);
    expect(kind.body.error.fields[0].path).toBe('kind');
  });

  it('is told the limit it is over', async () => {
    const story = await importStory(dataSource());
    const large = await story.send('machines', Buffer.alloc(importLimits.fileMaxBytes + 1, 65));
    expect(large.status).toBe(413);
    expect(large.body.error.message).toContain('16 MB');
    const many = await story.send('machines', `tag\n${'P\n'.repeat(importLimits.rowsMax + 1)}`);
    expect(many.status).toBe(413);
    expect(many.body.error.message).toContain('50000 rows');
  });
});
