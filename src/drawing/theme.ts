/** The colours and type of a drawing, and which of them each role takes; the caller brings them, so a drawing fits any theme. */
import type { Role } from '../protocol/picture';

/** All that a drawing takes from its surroundings. */
export interface Theme {
  readonly background: string;
  readonly text: string;
  /** Text that stands back: tick labels, axis titles, notes. */
  readonly muted: string;
  readonly grid: string;
  readonly wanted: string;
  readonly source: string;
  readonly harm: string;
  readonly good: string;
  readonly path: string;
  readonly noise: string;
  readonly focus: string;
  readonly fontFamily: string;
  readonly fontPx: number;
  /** Fills are hatched and lines are stronger, for readers to whom colours say little. */
  readonly highContrast: 'yes' | 'no';
}

/** The theme of an export that has no screen: dark ink on white. */
export const paperTheme: Theme = {
  background: '#ffffff',
  text: '#2b2b2b',
  muted: '#5f6368',
  grid: '#d9dce0',
  wanted: '#1767c0',
  source: '#a35a00',
  harm: '#c4201d',
  good: '#24762f',
  path: '#4d5259',
  noise: '#6b5b95',
  focus: '#1767c0',
  fontFamily: 'system-ui, "Segoe UI", "DejaVu Sans", sans-serif',
  fontPx: 12,
  highContrast: 'no',
};

/** The colour of a role. */
export function inkOf(role: Role, theme: Theme): string {
  return theme[inks[role]];
}

const inks = {
  wanted: 'wanted',
  source: 'source',
  landing: 'source',
  copy: 'source',
  harm: 'harm',
  limit: 'harm',
  path: 'path',
  total: 'wanted',
  pulse: 'path',
  stage: 'muted',
  envelope: 'wanted',
  noise: 'noise',
  rule: 'muted',
} as const satisfies Record<Role, keyof Theme>;
