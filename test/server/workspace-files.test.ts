/** The files of open specs: loaded once for all who ask, never kept where they have changed meanwhile, and let go with the last spec. */
import assert from 'node:assert/strict';
import { WorkspaceFiles } from '../../src/server/workspace-files';

const spec = 'file:///lagoon/specs/a.bandkeep.yaml';
const table = 'file:///lagoon/tables/hash.csv';

/** Files whose loads end when the test says so. */
function slowFiles() {
  const loads: { readonly uri: string; readonly end: (text: string) => void }[] = [];
  const files = new WorkspaceFiles(
    (uri) =>
      new Promise((resolve) =>
        loads.push({
          uri,
          end: (text) => {
            resolve({ text });
          },
        }),
      ),
    ['file:///lagoon'],
  );
  return { files, loads };
}

describe('workspace files', () => {
  it('are loaded once for two who ask at the same time', async () => {
    const { files, loads } = slowFiles();
    const both = [files.load(spec, ['tables/hash.csv']), files.load(spec, ['tables/hash.csv'])];
    assert.deepEqual(
      loads.map(({ uri }) => uri),
      [table],
    );
    loads[0]?.end('1');
    assert.deepEqual(await Promise.all(both), [true, true]);
    assert.deepEqual(files.sourceFor(spec).content('tables/hash.csv'), { text: '1' });
    assert.equal(await files.load(spec, ['tables/hash.csv']), false);
  });

  it('that change while they are loaded are loaded again', async () => {
    const { files, loads } = slowFiles();
    const first = files.load(spec, ['tables/hash.csv']);
    files.forget([table]);
    loads[0]?.end('old');
    await first;
    assert.equal(files.sourceFor(spec).content('tables/hash.csv'), null);
    const second = files.load(spec, ['tables/hash.csv']);
    loads[1]?.end('new');
    await second;
    assert.deepEqual(files.sourceFor(spec).content('tables/hash.csv'), { text: 'new' });
  });

  it('are let go when no open spec names them', async () => {
    const { files, loads } = slowFiles();
    const load = files.load(spec, ['tables/hash.csv', 'tables/other.csv']);
    for (const { end } of loads) end('1');
    await load;
    files.keepOnly([{ uri: spec, paths: ['tables/other.csv'] }]);
    assert.equal(files.sourceFor(spec).content('tables/hash.csv'), null);
    assert.deepEqual(files.sourceFor(spec).content('tables/other.csv'), { text: '1' });
  });

  it('are counted from the root that the workspace has now', () => {
    const { files } = slowFiles();
    const source = files.sourceFor(spec);
    assert.equal(source.path, 'specs/a.bandkeep.yaml');
    files.setFolders(['file:///lagoon/specs']);
    assert.equal(source.path, 'a.bandkeep.yaml');
  });

  it('that are open count as they stand there, in whatever spelling', () => {
    const { files } = slowFiles();
    files.setOpen('file:///lagoon/specs/%62.bandkeep.yaml', 'open');
    assert.deepEqual(files.sourceFor(spec).content('specs/b.bandkeep.yaml'), { text: 'open' });
  });
});
