import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { FileDrop } from '#src/components/file-drop.tsx';

afterEach(cleanup);

function show() {
  const onFiles = vi.fn<(files: File[]) => void>();
  render(<FileDrop label="Waveforms" hint="CSV files" endings={['.csv']} onFiles={onFiles} />);
  return { onFiles, namesOfLast: () => onFiles.mock.lastCall?.[0].map((file) => file.name) };
}

function fileEntry(name: string) {
  const file = new File(['0,1'], name);
  return {
    isFile: true,
    isDirectory: false,
    name,
    file: (give: (file: File) => void) => give(file),
  };
}

/** Hands its children out in portions of two, as a browser does in portions of a hundred. */
function folderEntry(name: string, children: { name: string }[]) {
  const left = [...children];
  return {
    isFile: false,
    isDirectory: true,
    name,
    createReader: () => ({
      readEntries: (give: (entries: { name: string }[]) => void) => give(left.splice(0, 2)),
    }),
  };
}

describe('FileDrop', () => {
  it('takes every file of a dropped folder, whatever the depth', async () => {
    const { onFiles, namesOfLast } = show();
    const folder = folderEntry('survey', [
      fileEntry('b.csv'),
      fileEntry('a.csv'),
      folderEntry('pump', [fileEntry('c.CSV')]),
    ]);
    fireEvent.drop(screen.getByRole('group', { name: 'Waveforms' }), {
      dataTransfer: { files: [], items: [{ webkitGetAsEntry: () => folder }] },
    });
    await vi.waitFor(() => expect(onFiles).toHaveBeenCalled());
    expect(namesOfLast()).toEqual(['a.csv', 'b.csv', 'c.CSV']);
  });

  it('takes files chosen with the button and says how many others were left out', async () => {
    const { namesOfLast } = show();
    const user = userEvent.setup({ applyAccept: false });
    await user.upload(screen.getByLabelText('Waveforms: files'), [
      new File(['1'], 'p.csv'),
      new File(['2'], 'photo.jpg'),
      new File(['3'], 'notes.txt'),
    ]);
    expect(namesOfLast()).toEqual(['p.csv']);
    expect(screen.getByRole('alert').textContent).toBe('2 files were left out: only .csv is read.');
  });
});
