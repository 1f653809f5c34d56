import papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { buildMember, buildSite } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const dataSource = useTestDatabase();
const story = inspectionStory(dataSource);

async function exported(plant: Plant, user: { id: number }, what: string) {
  const res = await story
    .app()
    .as(user)
    .get(plant.path(`/exports/${what}`));
  return {
    status: res.status,
    headers: res.headers as Record<string, string>,
    text: res.text,
    rows: papa.parse<Record<string, string>>(res.text.replace(/^\uFEFF/, ''), {
      header: true,
      skipEmptyLines: true,
    }).data,
  };
}

describe('the findings as CSV', () => {
  it('is a file with a name, and tells state, machine, score, last change and work order', async () => {
    const plant = await buildPlant(dataSource());
    const { findingId } = await story.assigned(plant);
    const { headers, text, rows } = await exported(plant, plant.analyst, 'findings');
    expect(headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(headers['content-disposition']).toBe('attachment; filename=findings.csv');
    expect(text.startsWith('\uFEFFfinding,')).toBe(true);
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      finding: String(findingId),
      state: 'inspecting',
      'machine tag': 'P-101',
      owner: 'Oskar Owner',
      'last change by': 'Lena Lead',
      'work orders': 'WO-4711',
      'newest inspection state': 'assigned',
    });
    expect(rows[0]?.['opened at (UTC)']).toMatch(/^\d{4}-\d\d-\d\dT[\d:.]+Z$/);
    expect(Number(rows[0]?.['score (0 to 1)'])).toBeGreaterThan(0);
  });

  it('keeps the filters of the list', async () => {
    const plant = await buildPlant(dataSource());
    await story.assigned(plant);
    expect((await exported(plant, plant.lead, 'findings?state=dismissed')).rows).toHaveLength(0);
    expect((await exported(plant, plant.lead, 'findings?search=P-101')).rows).toHaveLength(1);
  });

  it('holds for an owner their machines alone', async () => {
    const plant = await buildPlant(dataSource());
    await story.assigned(plant);
    expect((await exported(plant, plant.owner, 'findings')).rows).toHaveLength(1);
    expect((await exported(plant, plant.otherOwner, 'findings')).rows).toHaveLength(0);
  });

  it('lets no name begin as a formula of a spreadsheet', async () => {
    const plant = await buildPlant(dataSource());
    await dataSource()
      .getRepository(Machine)
      .update({ id: plant.machine.id }, { tag: '=1+1', name: '@SUM(A1), "pump"' });
    await story.assigned(plant);
    const { rows } = await exported(plant, plant.analyst, 'findings');
    expect(rows[0]).toMatchObject({ 'machine tag': "'=1+1", 'machine name': `'@SUM(A1), "pump"` });
  });

  it('goes on past the first page, each finding once', async () => {
    const plant = await buildPlant(dataSource());
    const { findingId } = await story.assigned(plant);
    await dataSource().query(
      `INSERT INTO finding (site_id, bearing_position_id, state, opened_at, version)
       SELECT site_id, bearing_position_id, 'dismissed', opened_at, 1
         FROM finding JOIN seq_1_to_450 WHERE id = ?`,
      [findingId],
    );
    const { rows } = await exported(plant, plant.analyst, 'findings');
    expect(rows).toHaveLength(451);
    expect(new Set(rows.map(({ finding }) => finding)).size).toBe(451);
  });
});

describe('the inspections as CSV', () => {
  it('tells due date, work order, outcome, and mean diameters in mm', async () => {
    const plant = await buildPlant(dataSource());
    const { inspectionId } = await story.accepted(plant);
    await story.report(plant, inspectionId, aReport());
    const { headers, rows } = await exported(plant, plant.lead, 'inspections');
    expect(headers['content-disposition']).toBe('attachment; filename=inspections.csv');
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      'work order': 'WO-4711',
      state: 'reported',
      'due on': '2099-12-01',
      overdue: 'no',
      outcome: 'loose',
      'fit put right': 'yes',
      'shaft seat condition as found': 'creep marks',
      // Mean of 59.97, 59.974 and 59.975 by hand.
      'shaft seat mean as found (mm)': '59.973',
      'housing seat mean as found (mm)': '',
    });
  });

  it('holds for an owner what they may see', async () => {
    const plant = await buildPlant(dataSource());
    await story.assigned(plant);
    expect((await exported(plant, plant.owner, 'inspections')).rows).toHaveLength(1);
    expect((await exported(plant, plant.otherOwner, 'inspections')).rows).toHaveLength(0);
  });
});

describe('the screenings as CSV', () => {
  it('tells point, verdict, speed in r/min, method version, decision and finding', async () => {
    const plant = await buildPlant(dataSource());
    const { findingId } = await story.assigned(plant);
    await plant.flag('axial', { verdict: 'retake', score: null });
    const { rows } = await exported(plant, plant.analyst, `screenings?surveyId=${plant.survey.id}`);
    expect(rows).toHaveLength(2);
    expect(rows[0]).toMatchObject({
      'survey date': '2026-11-02',
      point: 'P-101/DE/V',
      direction: 'vertical',
      run: '1',
      'newest run': 'yes',
      decision: 'accepted',
      'decided by': 'Ada Analyst',
      finding: String(findingId),
      'work orders': 'WO-4711',
    });
    expect(Number(rows[0]?.['speed (r/min)'])).toBeGreaterThan(0);
    expect(rows[0]?.['method version']).not.toBe('');
    expect(rows[1]).toMatchObject({ verdict: 'retake', 'score (0 to 1)': '', finding: '' });
  });

  it('is empty but for its header where nothing was screened', async () => {
    const plant = await buildPlant(dataSource());
    const { status, text } = await exported(plant, plant.analyst, 'screenings');
    expect(status).toBe(200);
    expect(text.trim().split('\r\n')).toHaveLength(1);
  });

  it('is not found for a survey of another site, and refused to an owner', async () => {
    const plant = await buildPlant(dataSource());
    const elsewhere = await buildSite(dataSource());
    const stranger = await buildMember(dataSource(), elsewhere, 'lead');
    const path = `/api/sites/${elsewhere.id}/exports/screenings?surveyId=${plant.survey.id}`;
    expect((await story.app().as(stranger).get(path)).status).toBe(404);
    expect((await exported(plant, plant.owner, 'screenings')).status).toBe(403);
  });
});
