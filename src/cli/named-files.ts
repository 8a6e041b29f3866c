/** The files that the checked specs name: each is loaded once, from within the root only, and stands in the result. */
import type { InputFile } from '../output';
import type { FileContent, FileSource } from '../spec';
import type { Host } from './host';

/** The files of one check. */
export class NamedFiles {
  private readonly contents = new Map<string, FileContent>();
  private readonly sums = new Map<string, string>();

  /** @param root absolute; no file outside of it is read. */
  constructor(
    private readonly host: Host,
    private readonly root: string,
  ) {}

  /** What a spec may name; `path` is its own from the root, with `/`. */
  sourceFor(path: string): FileSource {
    return { path, content: (asked) => this.content(asked) };
  }

  /** Every file that was read, by path. */
  get inputs(): readonly InputFile[] {
    return [...this.sums.keys()].sort().map((path) => ({ path, sha256: this.sums.get(path) ?? '' }));
  }

  private content(path: string): FileContent {
    const known = this.contents.get(path);
    if (known !== undefined) return known;
    const content = this.load(path);
    this.contents.set(path, content);
    return content;
  }

  private load(path: string): FileContent {
    const loaded = this.host.loadFile(this.root, path);
    if ('fault' in loaded) return loaded;
    this.sums.set(path, this.host.sha256(loaded.bytes));
    try {
      return { text: new TextDecoder('utf-8', { fatal: true }).decode(loaded.bytes) };
    } catch {
      return { fault: 'not-text' };
    }
  }
}
