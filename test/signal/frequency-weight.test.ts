/** The frequency itself as a gain. */
import assert from 'node:assert/strict';
import { frequencyWeight } from '../../src/signal/frequency-weight';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertClose } from '../support/tolerance';

describe('frequencyWeight', () => {
  it('is f, with bounds and slopes that enclose it', () => {
    const weight = frequencyWeight();
    assertClose(Math.exp(weight.logGain(123.4)), 123.4, 1e-14);
    assertBoundsEnclose(weight, 1000, 91);
    assertSlopeEncloses(weight, 1000, 92);
  });

  it('is nothing at 0 Hz, where its slope has no bound', () => {
    assert.equal(frequencyWeight().logGain(0), -Infinity);
    assert.equal(frequencyWeight().slope(0, 1), null);
  });
});
