import assert from 'node:assert/strict';
import { familyStages } from '../../src/remedies/stages';
import type { Stage } from '../../src/spec/channel';
import { bearing } from '../support/found';
import { butterworthForm, chebyshevForm, stage } from '../support/channel-builder';

const named = (...stages: readonly Stage[]): readonly string[] => familyStages(bearing({ stages })).map(({ words }) => words);

describe('the stages that a fix may change', () => {
  const amplifier = stage({ kind: 'bandwidth', cornerHz: 400e3 }, { label: 'pick-up guard, stage 1' });
  const family = stage(butterworthForm(4, 14e3), { label: 'pick-up guard, stage 2' });

  it('go by the name of their filter where only one of its stages can be meant', () => {
    assert.deepEqual(named(amplifier, family), ['`pick-up guard`']);
  });

  it('go by filter and number where several can', () => {
    const second = stage(chebyshevForm(3, 20e3, 0.1), { label: 'pick-up guard, stage 3' });
    assert.deepEqual(named(amplifier, family, second), ['`pick-up guard`, stage 2', '`pick-up guard`, stage 3']);
  });

  it('go by the name of a filter that is one stage', () => {
    assert.deepEqual(named(stage(butterworthForm(4, 14e3), { label: 'pick-up guard' })), ['`pick-up guard`']);
  });

  it('go by their own name where they have one', () => {
    assert.deepEqual(named({ ...family, name: 'knee' }), ['`knee`']);
  });

  it('are the filter where it stands alone without a name', () => {
    assert.deepEqual(named(stage(butterworthForm(4, 14e3))), ['the filter']);
    assert.deepEqual(named(stage(butterworthForm(4, 14e3)), stage(butterworthForm(2, 20e3), { label: 'stage 2' })), [
      'stage 1',
      'stage 2',
    ]);
  });

  it('are neither amplifiers nor parts, which a fix has no say in', () => {
    assert.deepEqual(named(amplifier), []);
  });
});
