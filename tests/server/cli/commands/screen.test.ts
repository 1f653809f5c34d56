import { describe, expect, it } from 'vitest';
import {
  folderOfFiles,
  runFretline,
  runThroughNpm,
  soundSamples,
  waveformFile,
} from './run-fretline.ts';

const told = ['# speed_rpm: 1500', '# sample_rate_hz: 2560'];
const twoColumns = soundSamples()
  .map((value, i) => `${(i / 2560).toFixed(9)};${value.toFixed(5)};${(0.5 * value).toFixed(5)}`)
  .join('\n');

const folder = folderOfFiles({
  'survey/b.csv': waveformFile([...told, 'velocity [mm/s]']),
  'survey/a.csv': waveformFile([...told, 'velocity [mm/s]']),
  'survey/deeper/c.CSV': waveformFile([...told, 'velocity [mm/s]']),
  'survey/.hidden.csv': 'not a waveform',
  'survey/notes.txt': 'not a waveform',
  'survey/broken.csv': waveformFile(told).replace(/\n[^\n]*\n$/u, '\noops\n'),
  'bare.csv': waveformFile(['# speed_rpm: 1490']),
  'two.csv': `time [s];1H [mm/s];1V [mm/s]\n${twoColumns}\n`,
  'empty/readme.md': 'nothing here',
  'machine.json':
    '{"nominalSpeedRpm": 1500, "line_frequency_hz": 50, "bladeCount": null, "colour": "red"}',
  'wrong.json': '{"nominalSpeedRpm": -1}',
  'torn.json': '{"nominalSpeedRpm":',
});

/** The names scripts rely on, by the description of the command line. */
const promisedKeys = [
  'file',
  'channel',
  'verdict',
  'score',
  'kind',
  'speedHz',
  'speedSource',
  'speedInterval',
  'orders',
  'harmonicRun',
  'truncation',
  'quality',
  'evidence',
  'methodVersion',
];

describe('fretline screen', { timeout: 30_000 }, () => {
  it('prints one line with the promised names for a waveform', async () => {
    const { status, lines, stderr } = await runFretline(['screen', 'survey/a.csv'], folder.path);
    expect(stderr).toBe('');
    expect(status).toBe(0);
    expect(lines).toHaveLength(1);
    const line = lines[0]!;
    expect(Object.keys(line)).toEqual(expect.arrayContaining(promisedKeys));
    expect(line['file']).toBe('survey/a.csv');
    expect(['none', 'suspected', 'likely', 'retake']).toContain(line['verdict']);
    expect(line['speedHz']).toBeCloseTo(25, 1);
    expect(['told', 'refined']).toContain(line['speedSource']);
    const first = (line['orders'] as Record<string, unknown>[]).find(({ order }) => order === 1)!;
    expect(Object.keys(first)).toEqual([
      'order',
      'frequencyHz',
      'velocityRms',
      'prominenceDb',
      'pNoise',
      'explainedBy',
    ]);
    // A sine of 1 mm/s peak.
    expect(first['velocityRms']).toBeCloseTo(Math.SQRT1_2, 1);
    expect(line['harmonicRun']).toMatchObject({
      length: expect.any(Number),
      pChance: expect.any(Number),
    });
    expect(Object.keys(line['truncation'] as object)).toEqual([
      'side',
      'share',
      'expectedShare',
      'instrument',
    ]);
  });

  it('takes files and folders in the order given, folders sorted and searched below', async () => {
    const { status, lines } = await runFretline(['screen', 'two.csv', 'survey'], folder.path);
    expect(lines.map((line) => [line['file'], line['channel']])).toEqual([
      ['two.csv', '1H'],
      ['two.csv', '1V'],
      ['survey/a.csv', 'velocity'],
      ['survey/b.csv', 'velocity'],
      ['survey/broken.csv', undefined],
      ['survey/deeper/c.CSV', 'velocity'],
    ]);
    expect(status).toBe(1);
    expect(lines[4]).toEqual({
      file: 'survey/broken.csv',
      error: { code: 'not-a-number', line: 4098, message: expect.stringContaining('“oops”') },
    });
  });

  it.each([
    ['a file that is not there', ['nowhere.csv'], 'not-found'],
    ['a folder without waveforms', ['empty'], 'no-files'],
    ['a file whose rate nobody tells', ['bare.csv', '--unit', 'g'], 'sample-rate-missing'],
    ['a file whose unit nobody tells', ['bare.csv', '--sample-rate-hz', '2560'], 'unit-missing'],
    ['a told unit against the header', ['survey/a.csv', '--unit', 'g'], 'contradictory-unit'],
    [
      'a told rate against the time column',
      ['two.csv', '--sample-rate-hz', '5120'],
      'contradictory-rate',
    ],
  ])('names %s on its line and goes on', async (_, args, code) => {
    const { status, lines } = await runFretline(['screen', ...args, 'survey/b.csv'], folder.path);
    expect(status).toBe(1);
    expect(lines[0]).toMatchObject({ file: args[0], error: { code, message: expect.any(String) } });
    expect(lines).toHaveLength(2);
  });

  it('prefers the told speed to the comment line', async () => {
    const args = [
      'screen',
      'bare.csv',
      '--speed-rpm',
      '1500',
      '--sample-rate-hz=2560',
      '--unit',
      'mm/s',
    ];
    const { status, lines } = await runFretline(args, folder.path);
    expect(status).toBe(0);
    expect(lines[0]!['speedHz']).toBeCloseTo(25, 1);
  });

  it('uses a machine file and warns of keys it does not know', async () => {
    const args = ['screen', 'survey/a.csv', '--machine', 'machine.json'];
    const { status, lines, stderr } = await runFretline(args, folder.path);
    expect(status).toBe(0);
    expect(lines).toHaveLength(1);
    expect(stderr).toContain('colour not used');
  });

  it.each([
    ['no file', []],
    ['an unknown option', ['survey/a.csv', '--speed', '1500']],
    ['a speed of zero', ['survey/a.csv', '--speed-rpm', '0']],
    ['a negative speed', ['survey/a.csv', '--speed-rpm=-1500']],
    ['a speed that is no number', ['survey/a.csv', '--speed-rpm', '1500rpm']],
    ['a negative rate', ['survey/a.csv', '--sample-rate-hz=-1']],
    ['a unit of something else', ['survey/a.csv', '--unit', 'mV']],
    ['an option told twice', ['survey/a.csv', '--unit', 'g', '--unit', 'mm/s']],
    ['a machine file with a value that can’t be', ['survey/a.csv', '--machine', 'wrong.json']],
    ['a machine file that is torn', ['survey/a.csv', '--machine', 'torn.json']],
    ['a machine file that is not there', ['survey/a.csv', '--machine', 'nowhere.json']],
  ])('refuses %s with a message on standard error and status 2', async (_, args) => {
    const { status, stdout, stderr } = await runFretline(['screen', ...args], folder.path);
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr).toMatch(/^fretline screen: .{10}/u);
  });

  it('runs through npm from any folder with nothing but results on standard output', async () => {
    const { status, stdout, lines } = await runThroughNpm(['screen', 'survey/a.csv'], folder.path);
    expect(status).toBe(0);
    expect(stdout.trim().split('\n')).toHaveLength(1);
    expect(lines[0]).toMatchObject({ file: 'survey/a.csv' });
  });
});

describe('fretline', { timeout: 30_000 }, () => {
  it('shows its usage when asked', async () => {
    for (const word of ['help', '--help']) {
      const { status, stdout, stderr } = await runFretline([word], folder.path);
      expect({ status, stderr }).toEqual({ status: 0, stderr: '' });
      expect(stdout).toContain('screen FILE_OR_FOLDER');
    }
  });

  it('refuses an unknown command and none at all with the usage on standard error', async () => {
    for (const args of [['scream'], []]) {
      const { status, stdout, stderr } = await runFretline(args, folder.path);
      expect({ status, stdout }).toEqual({ status: 2, stdout: '' });
      expect(stderr).toContain('Usage:');
    }
  });
});
