/** Files in memory for tests of readings that lean on other files. */
import type { FileContent, FileSource } from '../../../src/spec';

/** A source with these texts by path; everything else is missing. */
export function memoryFiles(path: string, texts: Readonly<Record<string, string>>): FileSource {
  return {
    path,
    content: (asked): FileContent => {
      const text = Object.hasOwn(texts, asked) ? texts[asked] : undefined;
      return text === undefined ? { fault: 'missing' } : { text };
    },
  };
}
