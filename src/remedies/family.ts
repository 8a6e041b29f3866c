/** The change of a stage to another family at the same order, with the ripple or the stop band that the family needs. */
import { editValue, exists, type Edit, type Family } from '../spec';
import { formatDb } from '../units/format';
import type { Change } from './change';
import { removalOf } from './key-removal';
import type { Session } from './session';
import type { FamilyStage } from './stages';
import { works, worksCleanly, type Trial } from './trial';

/** What else a family is told by. */
interface Target {
  readonly family: Family;
  readonly rippleDb?: number;
  readonly attenuationDb?: number;
}

/** From the plainest to the steepest; the last two for flat delays and clean steps. */
const targets: readonly Target[] = [
  { family: 'butterworth' },
  { family: 'legendre' },
  { family: 'chebyshev', rippleDb: 0.1 },
  { family: 'chebyshev', rippleDb: 0.5 },
  { family: 'inverse-chebyshev', attenuationDb: 60 },
  { family: 'elliptic', rippleDb: 0.1, attenuationDb: 60 },
  { family: 'elliptic', rippleDb: 0.1, attenuationDb: 80 },
  { family: 'bessel' },
  { family: 'gaussian' },
];

/** The proved change to the first family that works without a new warning, else to the first that works; null for none. */
export function* familyTrial(session: Session, stage: FamilyStage): Generator<void, Trial | null> {
  let fallback: Trial | null = null;
  for (const target of targets.filter(({ family }) => family !== stage.form.family)) {
    const trial: Trial | null = yield* session.attempt([familyChange(session, stage, target)]);
    if (trial !== null && worksCleanly(trial)) return trial;
    if (trial !== null && works(trial)) fallback ??= trial;
  }
  return fallback;
}

/** The change to one family. The corner stays the half-power point: other meanings of it go with the family they belong to. */
function familyChange(session: Session, stage: FamilyStage, { family, rippleDb, attenuationDb }: Target): Change | null {
  const edits = [
    valueEdit(session, stage, 'family', family),
    keyEdit(session, stage, 'ripple', rippleDb),
    keyEdit(session, stage, 'attenuation', attenuationDb),
    keyEdit(session, stage, 'corner-at', undefined),
  ];
  const made = edits.filter((edit) => edit !== 'unchanged');
  const whole = made.filter((edit) => edit !== null);
  if (whole.length < made.length) return null;
  const details = [
    ...(rippleDb === undefined ? [] : [`${formatDb(rippleDb)} of ripple`]),
    ...(attenuationDb === undefined ? [] : [`${formatDb(attenuationDb)} of stop band`]),
  ];
  const withWhat = details.length === 0 ? '' : ` with ${details.join(' and ')}`;
  return {
    kind: 'family',
    says: `Make ${stage.words} ${articleOf(family)} \`${family}\` filter${withWhat}`,
    about: stage.words,
    edits: whole,
  };
}

function articleOf(family: Family): string {
  return family === 'elliptic' || family === 'inverse-chebyshev' ? 'an' : 'a';
}

function valueEdit({ reading, channel }: Session, stage: FamilyStage, key: string, text: string): Edit | null {
  return editValue(reading, { channel: channel.name, path: [...stage.path, key] }, text);
}

/** A key that the family needs is written or added; one that it does not have is taken out. */
function keyEdit(session: Session, stage: FamilyStage, key: string, db: number | undefined): Edit | null | 'unchanged' {
  if (db !== undefined) return valueEdit(session, stage, key, `${db} dB`);
  const place = { channel: session.channel.name, path: [...stage.path, key] };
  return exists(session.reading, place) ? removalOf(session.reading, place) : 'unchanged';
}
