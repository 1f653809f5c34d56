import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { extractText, extractTextItems, getDocumentProxy } from 'unpdf';
import { describe, expect, it } from 'vitest';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import { safetyCautions } from '#shared/contracts/safety-cautions.ts';
import { buildMember, buildSite } from '#tests/support/factories.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from '../inspections/inspection-story.ts';

const dataSource = useTestDatabase();
const dataDirectory = mkdtempSync(join(tmpdir(), 'fretline-papers-'));
const story = inspectionStory(dataSource);
// The first to build it says where the files lie.
const app = () => buildTestApp(dataSource(), dataDirectory);

async function paper(plant: Plant, user: { id: number }, path: string) {
  const res = await app().as(user).get(plant.path(path)).buffer(true);
  if (res.status !== 200) {
    return { status: res.status, headers: res.headers, pages: [], text: '', feet: [] };
  }
  const document = await getDocumentProxy(new Uint8Array(res.body as Buffer));
  const { text } = await extractText(document);
  const { items } = await extractTextItems(document);
  const pages = text.map((page) => page.replace(/[\s\u00a0\u202f]+/g, ' '));
  // All that stands as low as the foot of the page or lower.
  const feet = items.map((page) => {
    const footAt = page.find(({ str }) => str.startsWith('A screening is a hint'))?.y ?? 0;
    return page.filter(({ str, y }) => str !== '' && y <= footAt + 4).map(({ str }) => str);
  });
  return { status: res.status, headers: res.headers, pages, text: pages.join(' '), feet };
}

/** A finding whose clearest screening has its plots and samples on the disk. */
async function findingWithPlots(plant: Plant) {
  const flag = await plant.flag();
  const waveform = await dataSource()
    .getRepository(Waveform)
    .findOneByOrFail({ id: flag.waveformId });
  const { files } = app().product;
  const samples = Float64Array.from({ length: waveform.sampleCount }, (_, i) =>
    Math.sin((2 * Math.PI * 24.6 * i) / waveform.sampleRateHz),
  );
  await files.write(
    files.samplesPath(waveform.contentHash, waveform.channelIndex),
    new Uint8Array(samples.buffer),
  );
  const spectrum = Float32Array.from([0.3125, ...new Float32Array(6000).fill(0.001)]);
  await files.write(
    files.plotPath(waveform.id, flag.run, 'spectrum'),
    new Uint8Array(spectrum.buffer),
  );
  const turn = Float32Array.from({ length: 256 }, (_, i) => Math.sin(i / 40));
  await files.write(
    files.plotPath(waveform.id, flag.run, 'averaged-revolution'),
    new Uint8Array(turn.buffer),
  );
  const res = await app()
    .as(plant.analyst)
    .post(plant.path(`/screenings/${flag.id}/decision`), { decision: 'accepted' });
  return (res.body as { findingId: number }).findingId;
}

describe('the paper of a finding', () => {
  it('is a PDF of one page with a name, and tells what the page of the finding tells', async () => {
    const plant = await buildPlant(dataSource());
    const findingId = await findingWithPlots(plant);
    const { headers, pages, text } = await paper(
      plant,
      plant.lead,
      `/findings/${findingId}/paper.pdf`,
    );
    expect(headers['content-type']).toBe('application/pdf');
    expect(headers['content-disposition']).toBe(
      `attachment; filename=finding-${findingId}-P-101.pdf`,
    );
    expect(pages).toHaveLength(1);
    for (const told of [
      'P-101 Pump, drive end',
      'Oskar Owner',
      'Looseness likely, score 0.82',
      'P-101/DE/V, survey of 2026-11-02',
      '1476 r/min',
      'method test-1',
      'Velocity, mm/s rms, over frequency, Hz',
      'Waveform, m/s², first 12 revolutions',
      'One averaged revolution, velocity, mm/s',
      'Orders 1 to 6 stand out.',
      'Shaft seat',
      'Housing seat',
      'Open, Ada Analyst',
      'not a diagnosis and not a release to run',
      plant.site.name,
      'Page 1 of 1',
    ]) {
      expect(text).toContain(told);
    }
    expect(text).not.toContain('□');
  });

  it('says so where plots and samples are no longer kept', async () => {
    const plant = await buildPlant(dataSource());
    const findingId = await story.openFinding(plant);
    const { status, text } = await paper(plant, plant.lead, `/findings/${findingId}/paper.pdf`);
    expect(status).toBe(200);
    expect(text).toContain('The spectrum of this screening is not kept.');
    expect(text).not.toContain('One averaged revolution');
  });

  it('stays on one page with long names and much to say, and tells how much it leaves out', async () => {
    const plant = await buildPlant(dataSource());
    await dataSource()
      .getRepository(Machine)
      .update({ id: plant.machine.id }, { tag: 'W'.repeat(40), name: 'Łukasiewicz½ '.repeat(9) });
    await dataSource()
      .getRepository(BearingPosition)
      .update({ id: plant.position.id }, { name: 'Gearbox, slow shaft '.repeat(6).slice(0, 120) });
    await plant.flag('horizontal', {
      evidence: Array.from({ length: 30 }, (_, index) => ({
        for: index % 2 === 0,
        text: `Sentence ${index} about the orders ${'that go on and on '.repeat(8)}.`,
      })),
    });
    const [flag] = (await app().as(plant.analyst).get(plant.path('/review-queue'))).body.items as {
      screeningId: number;
    }[];
    const accepted = await app()
      .as(plant.analyst)
      .post(plant.path(`/screenings/${flag?.screeningId}/decision`), {
        decision: 'accepted',
        reason: 'A reason that is told at length. '.repeat(50),
      });
    const findingId = (accepted.body as { findingId: number }).findingId;
    for (let version = 1; version <= 40; version += 1) {
      await app()
        .as(plant.lead)
        .post(plant.path(`/findings/${findingId}/decision`), {
          action: version % 2 === 1 ? 'dismiss' : 'reopen',
          reason: `Turn ${version}. ${'Word '.repeat(80)}`,
          version,
        });
    }
    const { pages, text, feet } = await paper(
      plant,
      plant.lead,
      `/findings/${findingId}/paper.pdf`,
    );
    expect(pages).toHaveLength(1);
    // Nothing else runs into it: two lines of caution, the page number, and what the paper is.
    expect(feet[0]).toHaveLength(4);
    expect(text).toMatch(/\d+ more on the page of the finding\./);
    expect(text).toContain('Łukasiewicz½');
  });

  it('is an owner’s only where the machine is theirs, and nobody’s of another site', async () => {
    const plant = await buildPlant(dataSource());
    const findingId = await story.openFinding(plant);
    const path = `/findings/${findingId}/paper.pdf`;
    expect((await paper(plant, plant.owner, path)).status).toBe(200);
    expect((await paper(plant, plant.otherOwner, path)).status).toBe(404);
    const elsewhere = await buildSite(dataSource());
    const stranger = await buildMember(dataSource(), elsewhere, 'lead');
    const there = await app().as(stranger).get(`/api/sites/${elsewhere.id}${path}`);
    expect(there.status).toBe(404);
  });
});

describe('the sheet of an inspection', () => {
  it('tells limits, plan and cautions, with blanks to fill', async () => {
    const plant = await buildPlant(dataSource());
    const findingId = await story.openFinding(plant);
    const res = await story.assign(plant, findingId, {
      checkHousingSeat: true,
      checkInPlace: true,
    });
    const inspectionId = (res.body as { id: number }).id;
    const { headers, pages, text } = await paper(
      plant,
      plant.owner,
      `/inspections/${inspectionId}/paper.pdf`,
    );
    expect(headers['content-disposition']).toBe(
      `attachment; filename=inspection-${inspectionId}-P-101.pdf`,
    );
    expect(pages.length).toBeLessThanOrEqual(3);
    expect(pages.at(-1)).toContain(`Page ${pages.length} of ${pages.length}`);
    for (const told of [
      'WO-4711',
      '2099-12-01',
      'Take the coupling <off> first.',
      'In place, before anything is opened',
      'Bolt torque',
      'below, mm/s rms',
      'Shaft diameter as found, mm / inch',
      'Outside diameter of the outer ring as left, mm / inch',
      'Plane 2, open end',
      '135°',
      // A quarter and three quarters of the 31 mm of a 6312, by hand.
      'Planes 7.8 mm and 23.3 mm',
      'fretting corrosion',
      'signature',
      ...safetyCautions,
    ]) {
      expect(text).toContain(told);
    }
  });

  it('holds what was reported once it is', async () => {
    const plant = await buildPlant(dataSource());
    const { inspectionId } = await story.accepted(plant);
    await story.report(plant, inspectionId, aReport());
    const { text } = await paper(plant, plant.lead, `/inspections/${inspectionId}/paper.pdf`);
    for (const told of [
      'Reported',
      'Shaft diameter as found, mm ',
      '59.9700',
      '59.9740',
      'Sleeve fitted, new bearing mounted.',
      'name Oskar Owner',
    ]) {
      expect(text).toContain(told);
    }
    expect(text).not.toContain('What was done, parts used');
  });

  it('asks for what is to be checked alone', async () => {
    const plant = await buildPlant(dataSource());
    const { inspectionId } = await story.assigned(plant);
    const { text } = await paper(plant, plant.owner, `/inspections/${inspectionId}/paper.pdf`);
    expect(text).toContain('Shaft diameter as found');
    expect(text).not.toContain('Housing bore as found');
    expect(text).not.toContain('Bolt torque');
    const other = await paper(plant, plant.otherOwner, `/inspections/${inspectionId}/paper.pdf`);
    expect(other.status).toBe(404);
  });
});

describe('the summary of a survey', () => {
  it('tells points measured, missing and to be taken again, and the flags worst first', async () => {
    const plant = await buildPlant(dataSource());
    await plant.flag('vertical', { verdict: 'suspected', score: 0.55 });
    await plant.flag('horizontal', { verdict: 'likely', score: 0.91 });
    await plant.flag('vertical', { verdict: 'retake', score: null });
    const { headers, pages, text } = await paper(
      plant,
      plant.analyst,
      `/surveys/${plant.survey.id}/paper.pdf`,
    );
    expect(headers['content-disposition']).toMatch(/filename=survey-Route-.*-2026-11-02\.pdf$/);
    expect(pages).toHaveLength(1);
    expect(text).toContain('Points measured 2 of 3');
    expect(text).toContain('Points without a waveform (1) P-101/DE/A');
    expect(text).toContain('To be taken again (1) P-101/DE/V');
    expect(text).toContain('1–6');
    expect(text).toContain('Method version test-1');
    expect(text.indexOf('0.91')).toBeLessThan(text.indexOf('0.55'));
  });

  it('goes on over as many pages as it takes, the table’s head on each', async () => {
    const plant = await buildPlant(dataSource());
    for (let count = 0; count < 90; count += 1) await plant.flag('axial', { verdict: 'none' });
    const { pages } = await paper(plant, plant.lead, `/surveys/${plant.survey.id}/paper.pdf`);
    expect(pages.length).toBeGreaterThan(1);
    for (const [index, page] of pages.entries()) {
      expect(page).toContain('Sampling rate');
      expect(page).toContain(`Page ${index + 1} of ${pages.length}`);
    }
    expect(pages.join(' ').match(/P-101\/DE\/A record\.csv/g)).toHaveLength(90);
  });

  it('says so where nothing has been uploaded, and is refused to an owner', async () => {
    const plant = await buildPlant(dataSource());
    const path = `/surveys/${plant.survey.id}/paper.pdf`;
    const { text } = await paper(plant, plant.analyst, path);
    expect(text).toContain('No waveform has been uploaded.');
    expect(text).toContain('No looseness signs were flagged');
    expect((await paper(plant, plant.owner, path)).status).toBe(403);
  });
});
