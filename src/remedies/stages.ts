/** The stages of a channel whose order and corner a designer chooses, and what titles call them. */
import { stagePath, type Channel, type FamilyForm, type Path, type Stage } from '../spec';

/** A stage that a fix may change. */
export interface FamilyStage {
  /** Where it stands below its channel. */
  readonly path: Path;
  readonly form: FamilyForm;
  /** "`pick-up guard`", "`pick-up guard`, stage 2", "the filter". */
  readonly words: string;
}

/** The family stages of a channel, in the order of the path. An amplifier's bandwidth or an RC's parts are not for a fix to choose. */
export function familyStages(channel: Channel): readonly FamilyStage[] {
  const found = channel.stages.flatMap((stage, index) => {
    const form = familyForm(stage);
    return form === null ? [] : [{ path: stagePath(channel, index), form, stage }];
  });
  return found.map(({ path, form, stage }) => ({
    path,
    form,
    words: stageWords(
      stage,
      found.map((other) => other.stage),
    ),
  }));
}

function familyForm({ form }: Stage): FamilyForm | null {
  return form.kind === 'family' ? form : null;
}

/** The shortest name that tells the stage from the others that a fix could mean. */
function stageWords(stage: Stage, family: readonly Stage[]): string {
  if (stage.name !== null) return `\`${stage.name}\``;
  const { filter, number } = partsOf(stage.label);
  if (filter === null) return family.length === 1 ? 'the filter' : stage.label;
  const alike = family.filter((other) => other.name === null && partsOf(other.label).filter === filter);
  return alike.length === 1 || number === null ? `\`${filter}\`` : `\`${filter}\`, stage ${number}`;
}

/** A label is "stage 2" in place, "pick-up guard, stage 2" in a named filter, or that filter's name where it has one stage. */
function partsOf(label: string): { readonly filter: string | null; readonly number: string | null } {
  const parts = /^(?:(?<filter>.*), )?stage (?<number>\d+)$/su.exec(label)?.groups;
  return parts === undefined
    ? { filter: label, number: null }
    : { filter: parts['filter'] ?? null, number: parts['number'] ?? null };
}
