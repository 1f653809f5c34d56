import { useId, useRef, useState, type DragEvent, type ReactNode } from 'react';
import { Button } from './button.tsx';
import { droppedFiles } from './dropped-files.ts';
import { Notice } from './notice.tsx';

export interface FileDropProps {
  /** Names the place, e.g. "Waveform files of this survey". */
  label: string;
  /** What is taken and within which limits. */
  hint: ReactNode;
  /** File endings taken, with the dot: others are left out and named. */
  endings: readonly string[];
  onFiles: (files: File[]) => void;
  disabled?: boolean;
  /** Offers choosing a whole folder too. */
  folders?: boolean;
}

/** Takes several files or a folder, dropped or chosen. */
export function FileDrop({
  label,
  hint,
  endings,
  onFiles,
  disabled = false,
  folders = true,
}: FileDropProps) {
  const fileInput = useRef<HTMLInputElement>(null);
  const folderInput = useRef<HTMLInputElement>(null);
  const [over, setOver] = useState(false);
  const [remark, setRemark] = useState<string | null>(null);
  const hintId = useId();

  const take = (files: readonly File[]) => {
    const fitting = files.filter((file) =>
      endings.some((ending) => file.name.toLowerCase().endsWith(ending)),
    );
    setRemark(leftOut(files.length - fitting.length, endings));
    if (fitting.length > 0) onFiles(fitting);
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    if (disabled) return;
    droppedFiles(event.dataTransfer).then(take, () =>
      setRemark('The browser could not read what was dropped. Choose the files with the button.'),
    );
  };
  const chosen = (input: HTMLInputElement) => {
    take(Array.from(input.files ?? []));
    // The same file may be chosen again after it was mended.
    input.value = '';
  };

  return (
    <div className="flex flex-col gap-2">
      <div
        role="group"
        aria-label={label}
        aria-describedby={hintId}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(!disabled);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        className={`flex flex-col items-start gap-3 border px-6 py-6 ${over ? 'border-ink bg-well' : 'border-dashed border-rule bg-sheet'}`}
      >
        <p className="text-lg font-semibold">
          {over
            ? 'Let go to add the files'
            : folders
              ? 'Drop a folder or files here'
              : 'Drop files here'}
        </p>
        <div id={hintId} className="max-w-prose text-sm text-ink-soft">
          {hint}
        </div>
        <div className="flex flex-wrap gap-2">
          <Button icon="file" disabled={disabled} onClick={() => fileInput.current?.click()}>
            Choose files
          </Button>
          {folders && (
            <Button icon="folder" disabled={disabled} onClick={() => folderInput.current?.click()}>
              Choose a folder
            </Button>
          )}
        </div>
        <input
          ref={fileInput}
          type="file"
          multiple
          hidden
          aria-label={`${label}: files`}
          accept={endings.join(',')}
          disabled={disabled}
          onChange={(event) => chosen(event.currentTarget)}
        />
        <input
          ref={folderInput}
          type="file"
          multiple
          hidden
          aria-label={`${label}: folder`}
          disabled={disabled}
          {...{ webkitdirectory: '' }}
          onChange={(event) => chosen(event.currentTarget)}
        />
      </div>
      {remark && <Notice loud>{remark}</Notice>}
    </div>
  );
}

function leftOut(count: number, endings: readonly string[]): string | null {
  if (count === 0) return null;
  const files = count === 1 ? '1 file was' : `${count} files were`;
  return `${files} left out: only ${endings.join(', ')} is read.`;
}
