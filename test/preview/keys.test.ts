/** Tests of the keys. */
import assert from 'node:assert/strict';
import { actionOf } from '../../src/preview/keys';

const press = (key: string, parts: object = {}): Parameters<typeof actionOf>[0] => ({
  ...{ key, shiftKey: false, ctrlKey: false, altKey: false, metaKey: false },
  ...parts,
});

describe('keys', () => {
  it('moves with arrows and pans with Shift', () => {
    assert.equal(actionOf(press('ArrowRight'))?.kind, 'step');
    assert.deepEqual(actionOf(press('ArrowRight', { shiftKey: true })), { kind: 'pan', share: 0.2 });
  });

  it('takes a letter in either case', () => {
    assert.deepEqual([actionOf(press('t'))?.kind, actionOf(press('T', { shiftKey: true }))?.kind], ['table', 'table']);
  });

  it('leaves every shortcut of the workbench alone', () => {
    for (const modifier of ['ctrlKey', 'altKey', 'metaKey']) assert.equal(actionOf(press('t', { [modifier]: true })), null);
    for (const key of ['Tab', 'F1', 'a', 'constructor', 'toString']) assert.equal(actionOf(press(key)), null);
  });
});
