import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';

/** Hands the case to the browser as <title>.case.json. */
export const saveFile = (casefile: CaseFile): void =>
  download(`${fileName(casefile.title)}.case.json`, `${JSON.stringify(casefile, null, 2)}\n`);

/** Hands the result to the browser as <title>.result.json, in the bytes that the command prints. */
export const saveResult = (casefile: CaseFile, result: Result): void =>
  download(`${fileName(casefile.title)}.result.json`, `${JSON.stringify(result)}\n`);

function download(name: string, text: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  link.download = name;
  link.click();
  URL.revokeObjectURL(link.href);
}

/** A title as a file name on every system: no separators, no control characters, not empty. */
const fileName = (title: string): string =>
  title
    .replace(/[\\/:*?"<>|\p{Cc}]+/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim()
    .replace(/^\.+|\.+$/g, '')
    .slice(0, 80) || 'case';
