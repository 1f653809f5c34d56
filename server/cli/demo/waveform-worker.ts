import type { SurveyIndex } from '#fixtures/demo/vibration.ts';
import { demoWaveformFile, type DemoPoint } from '#fixtures/demo/surveys.ts';

/** Makes one file of the demo in a worker thread: integrating a machine takes a tenth of a second. */
export const runTask = ({ point, survey }: { point: DemoPoint; survey: SurveyIndex }) =>
  demoWaveformFile(point, survey);
