/** Loads a file from the disk, for servers that run on Node. */
import { readFile, realpath, stat } from 'node:fs/promises';
import { isAbsolute, relative, sep } from 'node:path';
import { fileURLToPath } from 'node:url';
import { largestTable, type FileContent } from '../../language';

/**
 * A file's text, or why there is none; never throws. Only a plain file inside the root is opened, links followed.
 * @param uri of the scheme `file`
 * @param rootUri likewise, of a folder
 */
export async function loadFile(uri: string, rootUri: string): Promise<FileContent> {
  try {
    const [file, root] = await Promise.all([realpath(fileURLToPath(uri)), realpath(fileURLToPath(rootUri))]);
    if (isOutside(root, file)) return { fault: 'outside' };
    const found = await stat(file);
    if (found.isDirectory()) return { fault: 'folder' };
    if (!found.isFile()) return { fault: 'unreadable' };
    return found.size > largestTable ? { fault: 'too-large' } : textOf(await readFile(file));
  } catch (fault) {
    const code = fault instanceof Error && 'code' in fault ? fault.code : null;
    return { fault: code === 'ENOENT' || code === 'ENOTDIR' ? 'missing' : 'unreadable' };
  }
}

function textOf(bytes: Uint8Array): FileContent {
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    return { fault: 'not-text' };
  }
}

function isOutside(root: string, path: string): boolean {
  const way = relative(root, path);
  return way === '..' || way.startsWith(`..${sep}`) || isAbsolute(way);
}
