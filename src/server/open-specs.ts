/** The specs that are open in the editor, each judged in its newest version and no other. */
import { runInSlices } from '../jobs';
import { openSpec, type LiveSpec, type SpecDocument } from '../language';
import type { Platform } from './platform';
import type { WorkspaceFiles } from './workspace-files';

/** The open specs by the URI that the client gave them. */
export interface OpenSpecs {
  /** Opens a spec or takes its newer text. */
  change(uri: string, version: number, text: string): void;
  /** Has a spec judged anew, since a file that it leans on has changed. */
  refresh(uri: string): void;
  close(uri: string): void;
  get(uri: string): LiveSpec | undefined;
  all(): readonly LiveSpec[];
  /** Whether this is still the newest version of an open spec. */
  isNewest(document: SpecDocument): boolean;
  /** The newest version, judged: at once where that is done, else in slices. Null where the spec is not open, or was closed meanwhile. */
  judged(uri: string): Promise<SpecDocument | null>;
}

/** None open yet; `files` are those that specs name. */
export function createOpenSpecs(platform: Platform, files: WorkspaceFiles | null = null): OpenSpecs {
  const specs = new Map<string, LiveSpec>();
  const running = new Map<LiveSpec, { readonly revision: number; readonly end: Promise<unknown> }>();

  /** Reading tells which files are needed; one of them may need more. */
  const loadFiles = async (spec: LiveSpec, cancelled: () => boolean): Promise<void> => {
    if (files === null) return;
    while (!cancelled() && (await files.load(spec.uri, spec.read()))) continue;
  };

  const judgeNewest = async (spec: LiveSpec): Promise<void> => {
    const { revision } = spec;
    const cancelled = (): boolean => specs.get(spec.uri) !== spec || spec.revision !== revision;
    await loadFiles(spec, cancelled);
    await runInSlices(spec.judging(), { ...platform, cancelled });
  };

  const judge = async (spec: LiveSpec): Promise<void> => {
    const already = running.get(spec);
    if (already?.revision === spec.revision) {
      await already.end;
      return;
    }
    const run = { revision: spec.revision, end: judgeNewest(spec) };
    running.set(spec, run);
    try {
      await run.end;
    } finally {
      if (running.get(spec) === run) running.delete(spec);
    }
  };

  return {
    change(uri, version, text) {
      const spec = specs.get(uri);
      if (spec === undefined) specs.set(uri, openSpec(uri, version, text, files?.sourceFor(uri)));
      else spec.change(version, text);
    },
    refresh: (uri) => specs.get(uri)?.refresh(),
    close: (uri) => void specs.delete(uri),
    get: (uri) => specs.get(uri),
    all: () => [...specs.values()],
    isNewest: (document) => specs.get(document.uri)?.document === document,
    async judged(uri) {
      for (let spec = specs.get(uri); spec !== undefined; spec = specs.get(uri)) {
        if (spec.document !== null) return spec.document;
        await judge(spec);
      }
      return null;
    },
  };
}
