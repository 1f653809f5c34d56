import { createHash, randomUUID } from 'node:crypto';
import { writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { Piscina } from 'piscina';
import { surveyDates, type DemoPoint, type demoWaveformFile } from '#fixtures/demo/surveys.ts';
import type { SurveyIndex } from '#fixtures/demo/vibration.ts';
import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Product } from '#server/compose.ts';
import { typescriptWorkerPath } from '#server/screening/worker-pool.ts';
import { demoMachines } from './load-register.ts';

type Made = ReturnType<typeof demoWaveformFile>;

/** The threads that make the demo's waveforms. */
export function waveformMakers(): Piscina<unknown, Made> {
  return new Piscina({
    filename: typescriptWorkerPath,
    name: 'runTask',
    workerData: { module: new URL('./waveform-worker.ts', import.meta.url).href },
    minThreads: 2,
    maxThreads: 2,
    execArgv: [],
  });
}

/** Uploads one survey of the demo as an analyst would, file by file, and waits for its screenings. */
export async function loadSurvey(
  { services, files, queue }: Pick<Product, 'services' | 'files' | 'queue'>,
  makers: Piscina<unknown, Made>,
  analyst: SitePrincipal,
  routeId: number,
  survey: SurveyIndex,
): Promise<number> {
  const { survey: created, points } = await services.surveys.create(analyst, {
    routeId,
    surveyedOn: surveyDates[survey],
  });
  const labelled = (await services.routes.pointChoices(analyst)).filter((choice) =>
    points.some((point) => point.id === choice.id),
  );
  const upload = async (choice: (typeof labelled)[number]) => {
    const made = await makers.run({ point: demoPointOf(choice), survey });
    if (made === null) return;
    const path = join(files.incomingDirectory(), randomUUID());
    await writeFile(path, made.text);
    await services.uploads.take(analyst, created.id, {
      path,
      fileName: made.fileName,
      fileBytes: Buffer.byteLength(made.text),
      contentHash: createHash('sha256').update(made.text).digest('hex'),
      mapping: { channels: [{ channelIndex: 0, measuringPointId: choice.id }] },
    });
  };
  await Promise.all(labelled.map(upload));
  await queue.idle();
  return created.id;
}

function demoPointOf(choice: {
  label: string;
  machineTag: string;
  positionCode: string;
  direction: DemoPoint['direction'];
  nominalSpeedRpm: number | null;
}): DemoPoint {
  const position = demoMachines
    .find(({ machine }) => machine.tag === choice.machineTag)
    ?.positions.find((one) => one.position.code === choice.positionCode);
  return {
    label: choice.label,
    machineTag: choice.machineTag,
    positionCode: choice.positionCode,
    direction: choice.direction,
    nominalSpeedRpm: choice.nominalSpeedRpm ?? 1480,
    shaftRatio: position?.position.shaftRatio ?? 1,
  };
}
