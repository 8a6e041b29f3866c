/** Diagnostics: range, code, severity, links, tags, related places. */
import assert from 'node:assert/strict';
import { DiagnosticSeverity, DiagnosticTag } from 'vscode-languageserver-types';
import { diagnostics } from '../../src/language';
import { ableEditor, expectDiagnostics, opened, plainAbilities } from '../support/language-document';
import { passingSpec } from '../support/spec-texts';

const options = { abilities: ableEditor, docsBase: 'https://docs.lagoon.example/findings/' };

describe('diagnostics', () => {
  it('stand on exactly the values that are at fault', () => {
    expectDiagnostics(`bandkeep: 1
channels:
  bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted:
      - { name: drive hash, band: 40 kHz .. 3 MHz, level: -20 dBFS }
#                                 ^^^^^^^^^^^^^^^ alias-over-limit
    rate: 64 kHz
    filter: { family: butterworth, order: 2, corner: 11 kHz }
    bits: 16
    limits:
      alias: -96 dBFS
      flatness: 0.8 dB
#               ^^^^^^ flatness-over-limit
`);
  });

  it('are absent from a spec that passes', () => {
    expectDiagnostics(passingSpec);
  });

  it('name their page, their source and the related places', () => {
    const { document } = opened(passingSpec.replace('divide: 384', 'divide: 480'));
    const [item] = diagnostics(document, options);
    assert.equal(item?.code, 'alias-over-limit');
    assert.equal(item.severity, DiagnosticSeverity.Error);
    assert.equal(item.source, 'bandkeep');
    assert.deepEqual(item.codeDescription, { href: 'https://docs.lagoon.example/findings/alias-over-limit.md' });
    assert.ok(item.relatedInformation?.some(({ message }) => message === 'the limit'));
  });

  it('leave out what the editor cannot show', () => {
    const { document } = opened(passingSpec.replace('divide: 384', 'divide: 480'));
    const [item] = diagnostics(document, { abilities: plainAbilities, docsBase: null });
    assert.ok(item);
    assert.equal(item.relatedInformation, undefined);
    assert.equal(item.codeDescription, undefined);
  });

  it('fade an unused name, as a hint', () => {
    const { document } = opened(passingSpec.replace('channels:', '  spare: { bandwidth: 1 MHz }\n\nchannels:'));
    const item = diagnostics(document, options).find(({ code }) => code === 'unused-name');
    assert.ok(item);
    assert.equal(item.severity, DiagnosticSeverity.Hint);
    assert.deepEqual(item.tags, [DiagnosticTag.Unnecessary]);
  });

  it('warn where a limit is passed by little', () => {
    const { document } = opened(passingSpec.replace('snr: 84 dB', 'headroom: 2.5 dB'));
    const item = diagnostics(document, options).find(({ code }) => code === 'thin-margin');
    assert.equal(item?.severity, DiagnosticSeverity.Warning);
  });

  it('do not show what has been accepted', () => {
    const accepted = passingSpec
      .replace('divide: 384', 'divide: 480')
      .replace('      - { name: drive', '      # bandkeep: accept alias-over-limit, agreed in review 7\n      - { name: drive');
    assert.deepEqual(diagnostics(opened(accepted).document, options), []);
  });
});
