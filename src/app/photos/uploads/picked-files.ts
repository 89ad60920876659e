/** Whether a file is worth sending: what a folder holds besides pictures is passed over; its content still decides on the server. */
const looksLikePicture = (file: File) => file.type.startsWith('image/') || /\.(jpe?g|png|webp|avif|tiff?|gif|hei[cf])$/i.test(file.name);

const isFile = (entry: FileSystemEntry): entry is FileSystemFileEntry => entry.isFile;
const isFolder = (entry: FileSystemEntry): entry is FileSystemDirectoryEntry => entry.isDirectory;

/** Every picture in what was dropped, folders walked to the bottom. Files dropped by themselves are all kept, so that a wrong one is answered for. */
export async function droppedFiles(dropped: DataTransfer): Promise<File[]> {
  const entries = [...dropped.items].map((item) => item.webkitGetAsEntry()).filter((entry) => entry !== null);
  if (entries.length === 0) return [...dropped.files];
  return (await Promise.all(entries.map((entry) => (isFile(entry) ? fileOf(entry).then((file) => [file]) : picturesIn(entry))))).flat();
}

/** The pictures of a chosen folder. */
export const picturesOf = (files: FileList | null): File[] => [...(files ?? [])].filter(looksLikePicture);

async function picturesIn(entry: FileSystemEntry): Promise<File[]> {
  if (isFile(entry)) {
    const file = await fileOf(entry);
    return looksLikePicture(file) ? [file] : [];
  }
  if (!isFolder(entry)) return [];
  return (await Promise.all((await entriesOf(entry)).map(picturesIn))).flat();
}

const fileOf = (entry: FileSystemFileEntry) => new Promise<File>((resolve, reject) => entry.file(resolve, reject));

/** A folder gives its entries a hundred at a time, until it gives none. */
async function entriesOf(folder: FileSystemDirectoryEntry): Promise<FileSystemEntry[]> {
  const reader = folder.createReader();
  const all: FileSystemEntry[] = [];
  for (;;) {
    const some = await new Promise<FileSystemEntry[]>((resolve, reject) => reader.readEntries(resolve, reject));
    if (some.length === 0) return all;
    all.push(...some);
  }
}
