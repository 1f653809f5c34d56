import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, describe, expect, it } from 'vitest';
import { photoLimits, type InspectionPhotoResponse } from '#shared/contracts/inspection-photo.ts';
import type { InspectionResponse } from '#shared/contracts/inspection.ts';
import { buildPlant, type Plant } from '#tests/support/plant.ts';
import { buildTestApp } from '#tests/support/test-app.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';
import { aReport, inspectionStory } from './inspection-story.ts';

const database = useTestDatabase();
const directory = mkdtempSync(join(tmpdir(), 'fretline-photos-'));
afterAll(() => rmSync(directory, { recursive: true, force: true }));

const { accepted, assigned, report } = inspectionStory(database);
const as = (user: { id: number }) => buildTestApp(database(), directory).as(user);
/** Wires the application to this file's folder before any other step does. */
const begin = async () => {
  const plant = await buildPlant(database());
  as(plant.owner);
  return { plant, ...(await accepted(plant)) };
};

/** A picture that tells the camera and the place where it was taken. */
const aPicture = (width = 40, height = 20) =>
  sharp({ create: { width, height, channels: 3, background: '#c8a060' } }).withExif({
    IFD0: { Make: 'Plant phone' },
    IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '48/1 8/1 0/1' },
  });
const send = (
  plant: Plant,
  inspectionId: number,
  content: Buffer,
  { name = 'seat.jpg', user = plant.owner } = {},
) =>
  as(user)
    .post(plant.path(`/inspections/${inspectionId}/photos`))
    .attach('file', content, name);
const photosOf = (body: unknown) => body as InspectionPhotoResponse[];
const incoming = () => readdirSync(join(directory, 'incoming'));

describe('a photograph of an inspection', () => {
  it('is kept upright, small and full, without what the camera wrote about itself', async () => {
    const { plant, inspectionId } = await begin();
    const sent = await aPicture(4000, 2000).withMetadata({ orientation: 6 }).jpeg().toBuffer();
    expect((await sharp(sent).metadata()).exif?.includes('Plant phone')).toBe(true);

    const res = await send(plant, inspectionId, sent, { name: 'C:\\camera\\seat.jpg' });

    expect(res.status).toBe(201);
    const [photo] = photosOf(res.body);
    expect(photo).toMatchObject({
      fileName: 'seat.jpg',
      // Orientation 6 stands for a camera held upright: width and height change places.
      widthPx: 1280,
      heightPx: photoLimits.keptMaxPx,
      addedByName: 'Oskar Owner',
    });
    const address = plant.path(`/inspections/${inspectionId}/photos/${photo?.id}`);
    for (const [query, height] of [
      ['', photoLimits.keptMaxPx],
      ['?size=small', photoLimits.smallMaxPx],
    ] as const) {
      const picture = await as(plant.lead).get(address + query);
      expect(picture.headers['content-type']).toBe('image/jpeg');
      expect(picture.headers['x-content-type-options']).toBe('nosniff');
      expect(picture.headers['content-security-policy']).toMatch(/default-src 'none'/);
      const read = await sharp(picture.body as Buffer).metadata();
      expect(read).toMatchObject({ format: 'jpeg', height });
      expect([read.exif, read.xmp, read.iptc]).toEqual([undefined, undefined, undefined]);
      expect((picture.body as Buffer).includes('Plant phone')).toBe(false);
    }
    expect(incoming()).toEqual([]);
  });

  it.each([
    ['PNG', () => aPicture().png().toBuffer()],
    ['WebP', () => aPicture().webp().toBuffer()],
  ])('may be %s, and is shown with the inspection', async (_kind, make) => {
    const { plant, inspectionId } = await begin();
    expect((await send(plant, inspectionId, await make(), { name: 'x.dat' })).status).toBe(201);
    const res = await as(plant.analyst).get(plant.path(`/inspections/${inspectionId}`));
    expect((res.body as InspectionResponse).photos).toMatchObject([{ fileName: 'x.dat' }]);
  });

  it('sent twice is one', async () => {
    const { plant, inspectionId } = await begin();
    const picture = await aPicture().png().toBuffer();
    await send(plant, inspectionId, picture);
    const again = await send(plant, inspectionId, picture, { name: 'again.png' });
    expect(again.status).toBe(201);
    expect(photosOf(again.body)).toMatchObject([{ fileName: 'seat.jpg' }]);
  });

  it.each([
    ['a script named .jpg', Buffer.from('<script>alert(1)</script>'), /no photograph/],
    [
      'a drawing that may hold scripts',
      Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script/></svg>'),
      /no photograph/,
    ],
    ['an empty file', Buffer.alloc(0), /no photograph/],
    [
      // The first box of such a file: length, "ftyp", brand (ISO/IEC 23008-12).
      'a HEIC picture',
      Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic\0\0\0\0mif1heic')]),
      /HEIC.*JPEG/,
    ],
    ['a picture’s beginning alone', Buffer.from('ffd8ffe000104a46', 'hex'), /damaged/],
  ])('is refused in words where it is %s', async (_what, content, words) => {
    const { plant, inspectionId } = await begin();
    const res = await send(plant, inspectionId, content);
    expect(res.status).toBe(422);
    expect(res.body).toMatchObject({
      error: { code: 'unreadable_file', message: expect.stringMatching(words) as string },
    });
    expect(incoming()).toEqual([]);
  });

  it('is refused where it ends early', async () => {
    const { plant, inspectionId } = await begin();
    const noise = sharp({
      create: {
        width: 400,
        height: 400,
        channels: 3,
        background: '#000',
        noise: { type: 'gaussian', mean: 128, sigma: 30 },
      },
    });
    const whole = await noise.jpeg().toBuffer();
    const res = await send(plant, inspectionId, whole.subarray(0, whole.length / 2));
    expect(res.body).toMatchObject({
      error: { message: expect.stringMatching(/damaged/) as string },
    });
  });

  it('of 40 MB is refused with the limit, and nothing of it stays', async () => {
    const { plant, inspectionId } = await begin();
    const res = await send(plant, inspectionId, Buffer.alloc(40 * 1024 * 1024, 0xff));
    expect(res.status).toBe(413);
    expect(res.body).toMatchObject({
      error: { message: expect.stringMatching(/larger than 12 MB/) as string },
    });
    expect(incoming()).toEqual([]);
  });

  it('can be removed until the report, and not after', async () => {
    const { plant, inspectionId } = await begin();
    const [first] = photosOf(
      (await send(plant, inspectionId, await aPicture().png().toBuffer())).body,
    );
    const second = photosOf(
      (await send(plant, inspectionId, await aPicture(30, 30).png().toBuffer())).body,
    )[1];
    const remove = (id?: number, user = plant.owner) =>
      as(user).delete(plant.path(`/inspections/${inspectionId}/photos/${id}`));
    expect((await remove(first?.id)).status).toBe(204);
    expect((await remove(first?.id)).status).toBe(404);
    expect(readdirSync(join(directory, 'photos', String(inspectionId)))).toHaveLength(2);

    await report(plant, inspectionId, aReport());

    const late = await remove(second?.id);
    expect(late.status).toBe(409);
    expect(late.body).toMatchObject({
      error: { message: 'This inspection is reported: its photographs stay as they are.' },
    });
    const added = await send(plant, inspectionId, await aPicture(10, 10).png().toBuffer());
    expect(added.status).toBe(409);
  });

  it('waits until the inspection is accepted', async () => {
    const plant = await buildPlant(database());
    as(plant.owner);
    const { inspectionId } = await assigned(plant);
    const res = await send(plant, inspectionId, await aPicture().png().toBuffer());
    expect(res.status).toBe(409);
    expect(res.body).toMatchObject({
      error: { message: expect.stringMatching(/^Accept/) as string },
    });
  });

  it('is seen by lead, analyst and the owner, and exists for nobody else', async () => {
    const { plant, inspectionId } = await begin();
    const elsewhere = await buildPlant(database());
    const [photo] = photosOf(
      (await send(plant, inspectionId, await aPicture().png().toBuffer())).body,
    );
    const address = plant.path(`/inspections/${inspectionId}/photos/${photo?.id}`);
    const seenBy = async (user: { id: number }, path = address) =>
      (await as(user).get(path)).status;
    expect(await seenBy(plant.lead)).toBe(200);
    expect(await seenBy(plant.analyst)).toBe(200);
    expect(await seenBy(plant.owner)).toBe(200);
    expect(await seenBy(plant.otherOwner)).toBe(404);
    expect(await seenBy(elsewhere.lead)).toBe(404);
    const from = elsewhere.path(`/inspections/${inspectionId}/photos/${photo?.id}`);
    expect(await seenBy(elsewhere.lead, from)).toBe(404);
    const picture = await aPicture(15, 15).png().toBuffer();
    expect((await send(plant, inspectionId, picture, { user: plant.otherOwner })).status).toBe(404);
    expect((await send(plant, inspectionId, picture, { user: plant.lead })).status).toBe(403);
  });

  it('is one of twenty at most', async () => {
    const { plant, inspectionId } = await begin();
    for (let i = 0; i < photoLimits.maxPerInspection; i += 1) {
      await send(
        plant,
        inspectionId,
        await aPicture(10 + i, 10)
          .png()
          .toBuffer(),
      );
    }
    const res = await send(plant, inspectionId, await aPicture(60, 10).png().toBuffer());
    expect(res.status).toBe(422);
    expect(res.body).toMatchObject({
      error: { message: 'An inspection takes 20 photographs. Remove one first.' },
    });
  });
});
