/** Findings as the editor's diagnostics. */
import { DiagnosticSeverity, DiagnosticTag, type Diagnostic } from 'vscode-languageserver-types';
import { pageName, spanOfFinding, type Finding, type Severity } from '../findings';
import { spanOf } from '../spec';
import type { ClientAbilities } from './client-abilities';
import type { SpecDocument } from './spec-document';
import { rangeOf } from './text-range';

/** Who speaks, as editors show it beside the message. */
const source = 'bandkeep';

const severities: Readonly<Record<Severity, DiagnosticSeverity>> = {
  error: DiagnosticSeverity.Error,
  warning: DiagnosticSeverity.Warning,
  hint: DiagnosticSeverity.Hint,
};

/** What diagnostics depend on beside the spec itself. */
export interface DiagnosticOptions {
  readonly abilities: ClientAbilities;
  /** URI of the folder with a page for every finding code; null: no links. */
  readonly docsBase: string | null;
}

/** One diagnostic for each finding that nobody has accepted, in the order of the text. */
export function diagnostics(document: SpecDocument, options: DiagnosticOptions): Diagnostic[] {
  return document.judgement.findings
    .filter((finding) => finding.accepted === null)
    .map((finding) => diagnosticOf(document, finding, options));
}

/** The diagnostic of one finding. */
export function diagnosticOf(document: SpecDocument, finding: Finding, options: DiagnosticOptions): Diagnostic {
  const diagnostic: Diagnostic = {
    range: rangeOf(document.reading, spanOfFinding(document.reading, finding)),
    severity: severities[finding.severity],
    code: finding.code,
    source,
    message: finding.message,
  };
  if (options.docsBase !== null) diagnostic.codeDescription = { href: pageUri(options.docsBase, finding) };
  if (finding.code === 'unused-name') diagnostic.tags = [DiagnosticTag.Unnecessary];
  if (options.abilities.relatedInformation && finding.related.length > 0) {
    diagnostic.relatedInformation = finding.related.map(({ place, message }) => ({
      location: { uri: document.uri, range: rangeOf(document.reading, spanOf(document.reading, place)) },
      message,
    }));
  }
  return diagnostic;
}

function pageUri(docsBase: string, finding: Finding): string {
  return `${docsBase.replace(/\/$/, '')}/${pageName(finding)}`;
}
