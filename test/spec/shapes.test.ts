/** Tests of the constructors of shapes. */
import assert from 'node:assert/strict';
import { either, fields, listOf, quantity, text, whole, within, word } from '../../src/spec/shapes';

describe('joining shapes', () => {
  it('holds one thing for each form', () => {
    const shape = either(
      word({ off: 'None.' }),
      quantity('time'),
      listOf(text),
      fields('a thing', { a: { shape: text, about: 'A.' } }),
    );
    assert.deepEqual(Object.keys(shape).sort(), ['list', 'map', 'scalar']);
    assert.deepEqual(shape.scalar, { words: { off: 'None.' }, quantity: ['time'] });
  });

  it('refuses two lists, two maps and two of one kind of scalar', () => {
    const map = fields('a thing', {});
    assert.throws(() => either(listOf(text), listOf(text)), RangeError);
    assert.throws(() => either(map, map), RangeError);
    assert.throws(() => either(whole(1, 2), whole(3, 4)), RangeError);
  });

  it('joins bounds by unit', () => {
    const shape = either(
      within(quantity('time'), { s: { low: 0, high: 1 } }),
      within(word({ off: 'None.' }), { '%': { low: 0, high: 2 } }),
    );
    assert.deepEqual(shape.scalar?.bounds, { s: { low: 0, high: 1 }, '%': { low: 0, high: 2 } });
  });
});
