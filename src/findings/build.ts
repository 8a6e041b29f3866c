/** Builds findings, so that a check only states what is its own. */
import type { LimitFigure } from '../analysis/figures';
import type { Channel } from '../spec/channel';
import type { Path, Place } from '../spec/place';
import type { Finding, FindingFigures, JudgedCode, Severity } from './finding';
import { limitPlace } from './limits';

/** What a check states of a finding in one channel. */
export interface Statement {
  readonly code: JudgedCode;
  readonly severity: Severity;
  readonly message: string;
  readonly path: Path;
  readonly part?: 'value' | 'key' | 'pair';
  readonly ref?: string | null;
  readonly related?: readonly { readonly path: Path; readonly message: string }[];
  readonly figures?: Partial<FindingFigures>;
  readonly limit?: string;
}

/** A finding in a channel. Its `ref` is the one stated (a source's, a limit's), else the channel's own. */
export function findingIn(channel: Channel, statement: Statement): Finding {
  const { code, severity, message, path, part, ref, related, figures, limit } = statement;
  return {
    code,
    severity,
    channel: channel.name,
    ref: ref ?? channel.ref,
    message,
    at: { place: placeIn(channel, path, part) },
    related: (related ?? []).map((item) => ({ place: placeIn(channel, item.path), message: item.message })),
    figures: figures === undefined ? null : { ...noFigures, ...figures },
    limit: limit ?? null,
    accepted: null,
  };
}

/** A finding's numbers as a limit's figure has them. */
export function figuresOf(figure: LimitFigure): Partial<FindingFigures> {
  return {
    value: figure.value,
    nominal: figure.nominal,
    limit: figure.at,
    margin: figure.margin,
    frequency: figure.where?.frequency ?? null,
    lands: figure.where?.lands ?? null,
    source: figure.where?.source ?? null,
  };
}

/** The path of a limit's quantity below its channel. */
export function limitPath(channel: Channel, figure: Pick<LimitFigure, 'limit'>): Path {
  return limitPlace(channel, figure.limit).path;
}

/** The limit and the filter, as places that a broken limit points to. */
export function limitAndFilter(channel: Channel, figure: Pick<LimitFigure, 'limit'>): readonly { path: Path; message: string }[] {
  return [{ path: limitPath(channel, figure), message: 'the limit' }, ...filtersOf(channel)];
}

/** The filters that a channel has, by their keys. */
function filtersOf({ direction, stages, inputStages, outputStages }: Channel): readonly { path: Path; message: string }[] {
  if (direction !== 'relay') return stages.length === 0 ? [] : [{ path: ['filter'], message: 'the filter' }];
  return [
    ...(inputStages.length === 0 ? [] : [{ path: ['input-filter'], message: 'the filter before the sampling' }]),
    ...(outputStages.length === 0 ? [] : [{ path: ['output-filter'], message: 'the filter behind the sampling' }]),
  ];
}

const noFigures: FindingFigures = {
  value: null,
  nominal: null,
  limit: null,
  margin: null,
  frequency: null,
  lands: null,
  source: null,
};

function placeIn(channel: Channel, path: Path, part?: Place['part']): Place {
  return part === undefined ? { channel: channel.name, path } : { channel: channel.name, path, part };
}
