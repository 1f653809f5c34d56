/**
 * The files of a drop, folders opened to any depth, in order of path.
 *
 * `dataTransfer.files` lists a folder as one unreadable file, so the entries are walked where the
 * browser has them.
 */
export async function droppedFiles(transfer: DataTransfer): Promise<File[]> {
  // Both lists are emptied as soon as the event handler returns: take everything first.
  const plain = Array.from(transfer.files);
  const entries = Array.from(transfer.items)
    .map((item) => item.webkitGetAsEntry?.() ?? null)
    .filter((entry) => entry !== null);
  if (entries.length === 0) return plain;
  const nested = await Promise.all(entries.map(filesOf));
  return nested.flat();
}

async function filesOf(entry: FileSystemEntry): Promise<File[]> {
  if (isFileEntry(entry)) {
    return [await new Promise<File>((resolve, reject) => entry.file(resolve, reject))];
  }
  if (!isDirectoryEntry(entry)) return [];
  const children = await childrenOf(entry);
  children.sort((a, b) => a.name.localeCompare(b.name));
  const nested = await Promise.all(children.map(filesOf));
  return nested.flat();
}

/** A reader hands out entries in portions (100 in Chromium) and ends with an empty one. */
async function childrenOf(directory: FileSystemDirectoryEntry): Promise<FileSystemEntry[]> {
  const reader = directory.createReader();
  const all: FileSystemEntry[] = [];
  for (;;) {
    const portion = await new Promise<FileSystemEntry[]>((resolve, reject) =>
      reader.readEntries(resolve, reject),
    );
    if (portion.length === 0) return all;
    all.push(...portion);
  }
}

function isFileEntry(entry: FileSystemEntry): entry is FileSystemFileEntry {
  return entry.isFile;
}

function isDirectoryEntry(entry: FileSystemEntry): entry is FileSystemDirectoryEntry {
  return entry.isDirectory;
}
