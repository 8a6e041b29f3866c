/** The files that open specs name: loaded when they are asked for, kept until they change, and never from outside a spec's root. */
import type { FileContent, FileSource } from '../language';
import { encoded, plainSpelling, rootOf } from './roots';

/** Loads a file by its URI, from within the root only, links followed. */
export type LoadFile = (uri: string, rootUri: string) => Promise<FileContent>;

/** The files of one server. */
export class WorkspaceFiles {
  private readonly contents = new Map<string, FileContent>();
  private readonly loading = new Map<string, Promise<FileContent>>();
  /** Open specs win over what is on the disk. */
  private readonly open = new Map<string, string>();

  /** @param folders the URIs of the workspace's folders */
  constructor(
    private readonly loadFile: LoadFile,
    private folders: readonly string[],
  ) {}

  /** What a spec may name. */
  sourceFor(uri: string): FileSource {
    const pathOf = (): string => plainSpelling(uri).slice(rootOf(uri, this.folders).length);
    const content = (path: string): FileContent | null => {
      const place = this.placeOf(uri, path);
      const text = this.open.get(place);
      return text === undefined ? (this.contents.get(place) ?? null) : { text };
    };
    return {
      get path() {
        return pathOf();
      },
      content,
    };
  }

  /** Loads those of a spec's paths that have not been loaded; whether there were any. */
  async load(uri: string, paths: readonly string[]): Promise<boolean> {
    const places = paths.map((path) => this.placeOf(uri, path));
    const missing = places.filter((place) => !this.open.has(place) && !this.contents.has(place));
    await Promise.all(missing.map((place) => this.loadPlace(place, encoded(rootOf(uri, this.folders)))));
    return missing.length > 0;
  }

  /** Whether a spec that names these paths leans on one of these files. */
  leansOn(uri: string, paths: readonly string[], changed: readonly string[]): boolean {
    const places = new Set(changed.map(plainSpelling));
    return paths.some((path) => places.has(this.placeOf(uri, path)));
  }

  /** Takes the newest text of an open spec, or lets it go. */
  setOpen(uri: string, text: string | null): void {
    if (text === null) this.open.delete(plainSpelling(uri));
    else this.open.set(plainSpelling(uri), text);
  }

  /** Loads these anew when they are next asked for; what is being loaded of them no longer counts. */
  forget(uris: readonly string[]): void {
    for (const place of uris.map(plainSpelling)) {
      this.contents.delete(place);
      this.loading.delete(place);
    }
  }

  /** The same for the paths of one spec. */
  forgetPaths(uri: string, paths: readonly string[]): void {
    this.forget(paths.map((path) => encoded(this.placeOf(uri, path))));
  }

  /** Keeps only what the open specs name. */
  keepOnly(used: readonly { readonly uri: string; readonly paths: readonly string[] }[]): void {
    const places = new Set(used.flatMap(({ uri, paths }) => paths.map((path) => this.placeOf(uri, path))));
    for (const place of [...this.contents.keys()]) if (!places.has(place)) this.contents.delete(place);
  }

  /** The workspace has other folders now. */
  setFolders(folders: readonly string[]): void {
    this.folders = folders;
    this.contents.clear();
    this.loading.clear();
  }

  private placeOf(uri: string, path: string): string {
    return rootOf(uri, this.folders) + path;
  }

  private async loadPlace(place: string, rootUri: string): Promise<void> {
    const load = this.loading.get(place) ?? this.loadFile(encoded(place), rootUri);
    this.loading.set(place, load);
    const content = await load;
    // Where the file has changed meanwhile, whoever asked will ask again.
    if (this.loading.get(place) !== load) return;
    this.loading.delete(place);
    this.contents.set(place, content);
  }
}
