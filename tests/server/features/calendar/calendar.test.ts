import ICAL from 'ical.js';
import { describe, expect, it } from 'vitest';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { Machine } from '#server/db/entities/machine.entity.ts';
import { Membership } from '#server/db/entities/membership.entity.ts';
import { escapedText, foldedLine } from '#server/features/calendar/ical-text.ts';
import type { CalendarAddressResponse } from '#shared/contracts/calendar.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { testPublicUrl } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { inspectionStory } from '../inspections/inspection-story.ts';

// The outside reference is ical.js, an iCalendar (RFC 5545) parser with no part in writing the text.

const database = useTestDatabase();
const { app, assigned } = inspectionStory(database);

async function addressOf(plant: Plant, user: { id: number }): Promise<string> {
  const { body } = await app().as(user).post(plant.path('/calendar-feed'));
  return (body as CalendarAddressResponse).address.slice(testPublicUrl.length);
}

const read = (address: string) => app().signedOut.get(address);

const eventsIn = (text: string) =>
  new ICAL.Component(ICAL.parse(text) as unknown[])
    .getAllSubcomponents('vevent')
    .map((component) => new ICAL.Event(component));

describe('the calendar of inspections due', () => {
  it('shows a calendar program each inspection as a whole day, under an id that stays', async () => {
    const plant = await buildPlant(database());
    const name = 'Circulation pump; „north“, back\\slash ' + 'Größe µm '.repeat(9);
    await database().getRepository(Machine).update({ id: plant.machine.id }, { name });
    const { inspectionId } = await assigned(plant);
    const address = await addressOf(plant, plant.lead);
    const answer = await read(address);
    expect(answer.headers['content-type']).toBe('text/calendar; charset=utf-8');
    const [event, ...others] = eventsIn(answer.text);
    expect(others).toEqual([]);
    expect(event?.startDate.isDate).toBe(true);
    expect(event?.startDate.toString()).toBe('2099-12-01');
    expect(event?.endDate.toString()).toBe('2099-12-02');
    expect(event?.summary).toBe('Fit inspection due: P-101 Pump, drive end');
    expect(event?.description.split('\n')).toEqual([
      `P-101 ${name}, Pump, drive end`,
      'Work order: WO-4711',
      'Asset owner: Oskar Owner (assigned)',
      `${testPublicUrl}/sites/${plant.site.id}/inspections/${inspectionId}`,
    ]);
    await app()
      .as(plant.lead)
      .post(plant.path(`/inspections/${inspectionId}/due-date`), {
        version: 1,
        dueOn: '2099-12-31',
      });
    const [moved] = eventsIn((await read(address)).text);
    expect(moved?.uid).toBe(event?.uid);
    expect(moved?.sequence).toBeGreaterThan(event?.sequence ?? 0);
    expect(moved?.endDate.toString()).toBe('2100-01-01');
  });

  it('is made of CRLF lines of at most 75 octets, folded between characters (RFC 5545, 3.1)', async () => {
    const plant = await buildPlant(database());
    const name = 'Überdruckpumpe µ≥Ω🛠'.repeat(6).slice(0, 118);
    await database().getRepository(Machine).update({ id: plant.machine.id }, { name });
    await assigned(plant);
    const { text } = await read(await addressOf(plant, plant.lead));
    const lines = text.split('\r\n');
    expect(lines.at(-1)).toBe('');
    expect(lines.join('')).not.toMatch(/[\r\n]/);
    for (const line of lines) expect(Buffer.byteLength(line), line).toBeLessThanOrEqual(75);
    expect(text).not.toContain('\uFFFD');
  });

  it('shows an owner theirs, and leaves out what is done with', async () => {
    const plant = await buildPlant(database());
    const { inspectionId } = await assigned(plant);
    const own = await addressOf(plant, plant.owner);
    const other = await addressOf(plant, plant.otherOwner);
    expect(eventsIn((await read(own)).text)).toHaveLength(1);
    expect(eventsIn((await read(other)).text)).toEqual([]);
    const reported = { state: 'reported' } as const;
    await database().getRepository(Inspection).update({ id: inspectionId }, reported);
    expect(eventsIn((await read(own)).text)).toEqual([]);
  });

  it('is no more behind an address that was made anew, revoked, or whose owner has left', async () => {
    const plant = await buildPlant(database());
    const first = await addressOf(plant, plant.lead);
    const second = await addressOf(plant, plant.lead);
    expect((await read(first)).status).toBe(404);
    expect((await read(second)).status).toBe(200);
    const path = plant.path('/calendar-feed');
    expect((await app().as(plant.lead).get(path)).body).toMatchObject({
      createdAt: expect.any(String) as string,
      lastReadAt: expect.any(String) as string,
    });
    await app().as(plant.lead).delete(path);
    expect((await read(second)).status).toBe(404);
    expect((await app().as(plant.lead).get(path)).body).toEqual({
      createdAt: null,
      lastReadAt: null,
    });

    const left = await addressOf(plant, plant.owner);
    await database().getRepository(Membership).delete({ userId: plant.owner.id });
    expect((await read(left)).status).toBe(404);
    expect((await read('/api/calendar/nonsense.ics')).status).toBe(404);
  });
});

describe('escaping a text', () => {
  // RFC 5545, 3.3.11; the parser above forgives what is not escaped.
  it('escapes backslash, semicolon, comma and line breaks', () => {
    expect(escapedText('a\\b;c,d\r\ne\nf\tg')).toBe('a\\\\b\\;c\\,d\\ne\\nf g');
  });
});

describe('folding a line', () => {
  it('leaves 75 octets whole and begins each further line with a blank', () => {
    expect(foldedLine('x'.repeat(75))).toBe('x'.repeat(75));
    expect(foldedLine('x'.repeat(76))).toBe(`${'x'.repeat(75)}\r\n x`);
    expect(foldedLine(`${'x'.repeat(74)}µ`)).toBe(`${'x'.repeat(74)}\r\n µ`);
  });
});
