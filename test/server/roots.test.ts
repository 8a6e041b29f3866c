/** Roots: which folder the paths of a spec may not leave, however a client spells its URIs. */
import assert from 'node:assert/strict';
import { encoded, plainSpelling, rootOf } from '../../src/server/roots';

describe('the root of a spec', () => {
  const cases: readonly [string, readonly string[], string][] = [
    ['file:///lagoon/specs/a.bandkeep.yaml', ['file:///lagoon'], 'file:///lagoon/'],
    ['file:///lagoon/specs/a.bandkeep.yaml', ['file:///lagoon/'], 'file:///lagoon/'],
    ['file:///lagoon/specs/a.bandkeep.yaml', ['file:///lagoon', 'file:///lagoon/specs'], 'file:///lagoon/specs/'],
    ['file:///lagoon-old/a.bandkeep.yaml', ['file:///lagoon'], 'file:///lagoon-old/'],
    ['file:///c%3A/north%20basin/a.bandkeep.yaml', ['file:///C:/north%20basin'], 'file:///c:/north basin/'],
    ['vscode-vfs://quay/basin/specs/a.bandkeep.yaml', ['vscode-vfs://quay/basin'], 'vscode-vfs://quay/basin/'],
    ['file:///lagoon/specs/a.bandkeep.yaml', [], 'file:///lagoon/specs/'],
  ];
  for (const [uri, folders, root] of cases) {
    it(`of ${uri} in [${folders.join(', ')}] is ${root}`, () => {
      assert.equal(rootOf(uri, folders), root);
    });
  }

  it('reads the same in every spelling, and becomes a URI again', () => {
    for (const uri of ['file:///C:/a%20b/%C3%A9.csv', 'file:///c%3A/a%20b/é.csv']) {
      assert.equal(plainSpelling(uri), 'file:///c:/a b/é.csv');
    }
    assert.equal(encoded('file:///c:/a b/é.csv'), 'file:///c%3A/a%20b/%C3%A9.csv');
    assert.equal(encoded('vscode-vfs://quay/a#b/c?d.csv'), 'vscode-vfs://quay/a%23b/c%3Fd.csv');
  });

  it('survives a URI that is no proper one', () => {
    assert.equal(plainSpelling('file:///100%'), 'file:///100%');
  });
});
