/** The files that a spec names, as the caller has loaded them: reading itself does no I/O. */

/** Why a file could not be loaded; `outside` where its path or a link leads out of the root. */
export type FileFault = 'missing' | 'unreadable' | 'too-large' | 'outside' | 'folder' | 'not-text';

/** What a file holds. */
export type FileContent = { readonly text: string } | { readonly fault: FileFault };

/** Hands in what `Reading.paths` has asked for. */
export interface FileSource {
  /** The spec's own path from the root, with `/`: relative paths start in its folder. */
  readonly path: string;
  /** The content of a file by its path from the root, with `/`; null where it has not been loaded yet. */
  content(path: string): FileContent | null;
}

/** Tables with more than this are refused. */
export const largestTable = 64 * 1024 * 1024;

/** No files at all, for a text that stands alone. */
export const noFiles: FileSource = { path: '', content: () => null };
