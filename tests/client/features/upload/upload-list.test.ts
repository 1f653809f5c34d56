import { describe, expect, it, vi } from 'vitest';
import type { UploadMapping, UploadResponse } from '#shared/contracts/waveform.ts';
import type { MatchablePoint } from '#src/features/upload/match-point.ts';
import { readHead } from '#src/features/upload/read-head.ts';
import { faultsOf } from '#src/features/upload/upload-entry.ts';
import { UploadList } from '#src/features/upload/upload-list.ts';
import { ApiError } from '#src/lib/api-error.ts';

const points: MatchablePoint[] = ['M-DE', 'M-NDE', 'P-DE', 'P-NDE', 'G-DE'].map((code, index) => ({
  id: index + 1,
  machineTag: 'P-101',
  positionCode: code,
  direction: 'horizontal',
}));
const rows = (count = 32) => Array.from({ length: count }, (_, i) => (i % 7) / 10).join('\n');
const aFile = (name: string, head = '# sample_rate_hz: 2560\nacceleration [g]\n') =>
  new File([`${head}${rows()}\n`], name, { lastModified: 1 });
const goodFiles = () => points.map(({ positionCode }) => aFile(`P-101_${positionCode}_H.csv`));

interface Sent {
  name: string;
  mapping: UploadMapping;
  signal: AbortSignal;
  progress: (share: number) => void;
  finish: (answer?: Partial<UploadResponse>) => void;
  fail: (error: unknown) => void;
}

/** A list whose files go to a server that answers when the test says so. */
function aList() {
  const sent: Sent[] = [];
  const kept = new Map<string, string>();
  const list = new UploadList({
    readHead,
    store: {
      getItem: (key) => kept.get(key) ?? null,
      setItem: (key, value) => void kept.set(key, value),
    },
    onSettled: () => undefined,
    send: (file, mapping, { signal, onProgress }) =>
      new Promise((resolve, reject) => {
        signal.addEventListener('abort', () => reject(new DOMException('', 'AbortError')));
        sent.push({
          name: file.name,
          mapping,
          signal,
          progress: (share) => onProgress(share * 1000, 1000),
          finish: (answer = {}) => resolve({ alreadyThere: false, waveforms: [], ...answer }),
          fail: reject,
        });
      }),
  });
  list.know({ points, routePointIds: new Set(points.map(({ id }) => id)) });
  const states = () => list.snapshot().map(({ state }) => state);
  return { list, sent, states, entry: (index: number) => list.snapshot()[index]! };
}

describe('the list of files of a survey', () => {
  it('reads each file and says what is missing before it can be sent', async () => {
    const { list, entry, sent } = aList();
    await list.add([aFile('P-101_M-DE_H.csv'), aFile('somewhere.csv', '')]);
    expect(faultsOf(entry(0))).toEqual([]);
    expect(faultsOf(entry(1)).map(({ message }) => message)).toEqual([
      'The file doesn’t say its sampling rate: enter it.',
      'Choose the measuring point.',
      'The file doesn’t say its unit: choose it.',
    ]);
    list.sendAll();
    expect(sent.map(({ name, mapping }) => [name, mapping])).toEqual([
      ['P-101_M-DE_H.csv', { channels: [{ channelIndex: 0, measuringPointId: 1 }] }],
    ]);
  });

  it('shows the line of a file that can’t be read and sends the others', async () => {
    const { list, entry, sent } = aList();
    const broken = new File(['acceleration [g]\n1\n2\noverflow\n4\n'], 'P-101_P-DE_H.csv');
    await list.add([broken, aFile('P-101_M-DE_H.csv')]);
    expect(faultsOf(entry(0))).toMatchObject([{ line: 4 }]);
    list.sendAll();
    expect(sent.map(({ name }) => name)).toEqual(['P-101_M-DE_H.csv']);
  });

  it('sends what a person has settled, and remembers it for files of the same shape', async () => {
    const { list, entry, sent } = aList();
    await list.add([aFile('P-101_M-DE_H.csv', ''), aFile('P-101_P-DE_H.csv', '')]);
    list.change(entry(0).id, { sampleRateHz: 1024, toldSpeedRpm: 990 });
    list.changeChannel(entry(0).id, 0, { unit: 'mm/s' });
    expect(faultsOf(entry(1))).toEqual([]);
    await list.add([aFile('P-101_G-DE_H.csv', '')]);
    list.sendAll();
    expect(sent.map(({ mapping }) => mapping)).toEqual([
      {
        channels: [{ channelIndex: 0, measuringPointId: 1, unit: 'mm/s' }],
        sampleRateHz: 1024,
        toldSpeedRpm: 990,
      },
      { channels: [{ channelIndex: 0, measuringPointId: 3, unit: 'mm/s' }], sampleRateHz: 1024 },
      { channels: [{ channelIndex: 0, measuringPointId: 5, unit: 'mm/s' }], sampleRateHz: 1024 },
    ]);
  });

  it('sends three at a time and the next when one has arrived', async () => {
    const { list, sent, states } = aList();
    await list.add(goodFiles());
    list.sendAll();
    expect(sent).toHaveLength(3);
    sent[1]?.progress(0.5);
    sent[2]?.progress(1);
    expect(states()).toEqual(['sending', 'sending', 'checking', 'waiting', 'waiting']);
    expect(list.snapshot()[1]?.sentBytes).toBeCloseTo(goodFiles()[1]!.size / 2);
    sent[0]?.finish();
    await vi.waitFor(() => expect(sent).toHaveLength(4));
    expect(states()[0]).toBe('sent');
  });

  it('says of a file the survey had already that it is there', async () => {
    const { list, sent, states } = aList();
    await list.add([aFile('P-101_M-DE_H.csv')]);
    list.sendAll();
    sent[0]?.finish({ alreadyThere: true });
    await vi.waitFor(() => expect(states()).toEqual(['there']));
  });

  it('stops on request and takes every file up again', async () => {
    const { list, sent, states } = aList();
    await list.add(goodFiles());
    list.sendAll();
    sent[0]?.finish();
    await vi.waitFor(() => expect(sent).toHaveLength(4));
    list.stop();
    await vi.waitFor(() => expect(states()).toEqual(['sent', 'ready', 'ready', 'ready', 'ready']));
    expect(sent.slice(1).every(({ signal }) => signal.aborted)).toBe(true);
    list.sendAll();
    await vi.waitFor(() => expect(sent).toHaveLength(7));
    expect(sent[4]?.name).toBe('P-101_M-NDE_H.csv');
  });

  it('keeps the list when the connection is lost, and does not try the rest against it', async () => {
    const { list, sent, states, entry } = aList();
    await list.add(goodFiles());
    list.sendAll();
    sent[0]?.fail(new ApiError('unreachable', 'The server can’t be reached.', { status: 0 }));
    await vi.waitFor(() => expect(states()[0]).toBe('failed'));
    expect(entry(0).failure).toBe('The server can’t be reached.');
    expect(states()).toEqual(['failed', 'sending', 'sending', 'ready', 'ready']);
    sent[1]?.finish();
    sent[2]?.finish();
    await vi.waitFor(() => expect(states().slice(1, 3)).toEqual(['sent', 'sent']));
    list.sendAll();
    expect(sent.slice(3).map(({ name }) => name)).toEqual([
      'P-101_M-DE_H.csv',
      'P-101_P-NDE_H.csv',
      'P-101_G-DE_H.csv',
    ]);
  });

  it('sends a file the server refused again only when asked for that one', async () => {
    const { list, sent, states, entry } = aList();
    await list.add([aFile('P-101_M-DE_H.csv')]);
    list.sendAll();
    sent[0]?.fail(new ApiError('unreadable_file', 'Line 9000: “x” …', { status: 422 }));
    await vi.waitFor(() => expect(states()).toEqual(['refused']));
    expect(entry(0).failure).toBe('Line 9000: “x” …');
    list.sendAll();
    expect(sent).toHaveLength(1);
    list.sendOne(entry(0).id);
    expect(sent).toHaveLength(2);
  });

  it('breaks a file off that is taken off the list', async () => {
    const { list, sent, entry, states } = aList();
    await list.add([aFile('P-101_M-DE_H.csv')]);
    list.sendAll();
    list.remove(entry(0).id);
    expect(sent[0]?.signal.aborted).toBe(true);
    expect(states()).toEqual([]);
  });

  it('holds a file that is dropped twice once', async () => {
    const { list, states } = aList();
    await list.add([aFile('P-101_M-DE_H.csv')]);
    await list.add(['M-DE', 'P-DE', 'P-DE'].map((code) => aFile(`P-101_${code}_H.csv`)));
    expect(states()).toEqual(['ready', 'ready']);
  });

  it('refuses two columns of a file at one point', async () => {
    const { list, entry } = aList();
    const columns = Array.from({ length: 32 }, (_, i) => `${i / 1000},${i % 3},${i % 5}`).join(
      '\n',
    );
    await list.add([new File([`time [s],a [g],b [g]\n${columns}\n`], 'both.csv')]);
    list.changeChannel(entry(0).id, 0, { pointId: 1 });
    list.changeChannel(entry(0).id, 1, { pointId: 1 });
    expect(faultsOf(entry(0))).toMatchObject([
      { message: 'Two of its channels have the same point.' },
    ]);
    list.changeChannel(entry(0).id, 1, { taken: false });
    expect(faultsOf(entry(0))).toEqual([]);
  });
});
