import { api, type DownloadedFile } from './api-client';

/** Long enough for a tab or a disk to have read it. */
const keptMs = 60_000;

function addressOf({ content }: DownloadedFile): string {
  const address = URL.createObjectURL(content);
  window.setTimeout(() => {
    URL.revokeObjectURL(address);
  }, keptMs);
  return address;
}

function save(file: DownloadedFile): void {
  const link = document.createElement('a');
  link.href = addressOf(file);
  link.download = file.name;
  link.click();
}

/**
 * Fetches a file first, and saves it only once it is one: a browser left to itself would save a refusal under its name.
 * @throws ProblemError, NoLineError: then nothing was saved
 */
export async function saveFile(path: string): Promise<void> {
  save(await api.download(path));
}

/**
 * The same, shown in a tab of its own. Where the browser opens none, it is saved.
 * @throws ProblemError, NoLineError: then no tab was opened
 */
export async function openFile(path: string): Promise<void> {
  const file = await api.download(path);
  if (window.open(addressOf(file), '_blank') === null) save(file);
}
