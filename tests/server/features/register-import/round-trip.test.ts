import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { registerKinds, type RegisterKind } from '#shared/contracts/register-import.ts';
import { buildMachine, buildPoint, buildPosition } from '#tests/support/factories.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { importStory } from './import-story.ts';

const dataSource = useTestDatabase();

const nastyTexts = [
  '=HYPERLINK("http://x.example","click")',
  '=1+1',
  '+49 (0)30 1234',
  '-P-101',
  '@SUM(A1:A9)',
  "'=1+1",
  "''quoted",
  "'s-Hertogenbosch",
  'say "hello"',
  'a,b;c\td',
  'first line\nsecond line\r\nthird',
  '\u201EÄÖÜ äöü ß\u201C, 10\u00B0',
  '日本語 😀',
  '12,5',
  '1e3',
  'TRUE',
  '#N/A',
  'ﬀ＝1',
  '＝1+1',
];

async function sameAgain(
  story: Awaited<ReturnType<typeof importStory>>,
  kinds: readonly RegisterKind[] = registerKinds,
) {
  for (const kind of kinds) {
    const file = await story.exported(kind);
    const { id, counts, rowCount } = await story.dryRun(kind, file);
    const others = [...(await story.rows(id, 'wrong')), ...(await story.rows(id, 'changed'))];
    expect({ kind, others }).toEqual({ kind, others: [] });
    expect({ kind, ...counts }).toEqual({ kind, new: 0, changed: 0, same: rowCount, wrong: 0 });
  }
}

describe('an exported register', () => {
  it('imports as the same, row for row, with nasty names in every text', async () => {
    const story = await importStory(dataSource());
    for (const [index, text] of nastyTexts.entries()) {
      const oneLine = text.replace(/\p{Cc}/gu, ' ').slice(0, 20);
      const machine = await buildMachine(dataSource(), story.site, {
        tag: `${oneLine}${index}`,
        name: text.slice(0, 120),
        drive: oneLine,
        notes: text,
        powerKw: index / 7,
        nextPlannedStopOn: '2027-02-28',
        ownerUserId: index % 2 === 0 ? story.owner.id : null,
      });
      const position = await buildPosition(dataSource(), machine, {
        code: `${oneLine}${index}`.slice(0, 24),
        name: oneLine,
        // Older rows may hold what the forms would not take today; they still come back the same.
        designation: index === 0 ? 'odd 1234' : '6312',
        shaftC: -12.5,
        shaftRatio: 1 / 3,
        splitHousing: index % 2 === 0,
        shaftSeatForm: index % 2 === 0 ? 'cylindrical' : 'adapter sleeve',
        seatTaper: index % 2 === 0 ? null : '1:12',
        radialLoadN: 1e-7 * index,
      });
      await buildPoint(dataSource(), position, 'axial');
      for (const seatMeasuredMm of [60.012, 60.1 + 0.2 / 3]) {
        // Two records of one seat and date are there: an inspection may have added the second.
        await dataSource().getRepository(FitRecord).insert({
          bearingPositionId: position.id,
          seat: 'shaft',
          recordedOn: '2026-03-04',
          source: 'inspection',
          toleranceClass: 'k5',
          seatMeasuredMm,
          ringMeasuredMm: null,
          diameterUnit: 'in',
          driveUpMm: 0.35,
          clearanceReductionUm: 25,
          bonding: 'not bonded',
          condition: 'fretting corrosion',
          note: text,
          inspectionId: null,
          recordedByUserId: story.lead.id,
          createdAt: new Date(),
        });
      }
    }
    await sameAgain(story);
  });

  it('has no cell that a spreadsheet would run', async () => {
    const story = await importStory(dataSource());
    for (const [index, text] of nastyTexts.entries()) {
      await buildMachine(dataSource(), story.site, { tag: `T-${index}`, name: text, drive: text });
    }
    const cells = (await story.exported('machines')).split(/[,\r\n]/);
    expect(cells.filter((cell) => /^"?[=+@]/.test(cell))).toEqual([]);
    expect(cells).toContain("'=1+1");
    expect(cells).toContain("'-P-101");
  });

  it('is UTF-8 with its mark, ISO dates and units in the header', async () => {
    const story = await importStory(dataSource());
    await buildMachine(dataSource(), story.site, { tag: 'P-1', nextPlannedStopOn: '2027-02-28' });
    const text = await story.exported('machines');
    expect(text.startsWith('\uFEFFtag,name,kind,drive,power [kW],nominal speed [r/min],')).toBe(
      true,
    );
    expect(text).toContain('2027-02-28');
    const answer = await story.as(story.lead).get(`${story.path}/register/exports/machines`);
    expect(answer.headers['content-disposition']).toContain('machines.csv');
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
  });

  it('imports into an empty site and is exported from there word for word', async () => {
    const from = await importStory(dataSource());
    const machine = await buildMachine(dataSource(), from.site, { notes: '=x\n"y"', tag: '-1' });
    const position = await buildPosition(dataSource(), machine, { code: '+A', mustSlide: true });
    await buildPoint(dataSource(), position, 'vertical');
    const into = await importStory(dataSource());
    for (const kind of registerKinds) {
      const file = await from.exported(kind);
      if (kind !== 'fit-records') await into.load(kind, file);
      expect(await into.exported(kind)).toBe(file);
    }
  });

  it('imports as the same for any names at all', async () => {
    const story = await importStory(dataSource());
    const part = fc.constantFrom("'", '=', '+', '-', '@', '"', ',', ';', '\n', '\t', 'ä', 'x', ' ');
    const text = fc
      .array(part, { minLength: 1, maxLength: 12 })
      .map((parts) => parts.join('').trim())
      .filter((one) => one !== '');
    await fc.assert(
      fc.asyncProperty(fc.array(text, { minLength: 1, maxLength: 20 }), async (texts) => {
        await dataSource().getRepository(Machine).delete({ siteId: story.site.id });
        for (const [index, one] of texts.entries()) {
          await buildMachine(dataSource(), story.site, {
            tag: `${one.replace(/\p{Cc}/gu, '')}${index}`,
            name: one.replace(/\p{Cc}/gu, '') || 'x',
            notes: one,
          });
        }
        await sameAgain(story, ['machines']);
      }),
      { numRuns: 15, seed: 20261201 },
    );
  });
});
