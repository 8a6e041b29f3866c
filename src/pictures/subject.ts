/** All that a picture is made from: one whole channel with its figures, its path and its findings. */
import { channelPath, relativeTo, worstPath } from '../analysis';
import type { ChannelPath, Figures, JudgedKey, LimitFigure, Response } from '../analysis';
import type { Finding, Judgement } from '../findings';
import type { PlaceName } from '../protocol/position';
import { exists } from '../spec';
import type { Channel } from '../spec/channel';

/** One channel, ready to be drawn. */
export interface Subject {
  readonly channel: Channel;
  readonly figures: Figures;
  readonly findings: readonly Finding[];
  readonly passes: boolean;
  readonly path: ChannelPath;
  /** What the path does to levels as they are stated: at nominal values, and at the largest that the tolerances allow. */
  readonly nominal: Response;
  readonly largest: Response;
  /** The channel's place at a path, or the nearest around it that stands in the text; null where there is none. */
  readonly placeOf: (path: PlaceName['path']) => PlaceName | null;
}

/** The subject of a channel's picture; a channel that is not whole has none. */
export function subjectOf(judgement: Judgement, channelName: string): Subject {
  const judged = judgement.channels.find((candidate) => candidate.entry.name === channelName);
  const channel = judged?.entry.channel ?? null;
  const figures = judged?.figures ?? null;
  if (channel === null || figures === null) throw new RangeError(`\`${channelName}\` is not a whole channel of this spec`);
  const path = channelPath(channel);
  // Levels that hold at the sampler are measured from the reference, so the path counts from there.
  const referenceHz = channel.levelsAt === 'sampler' ? channel.referenceHz : null;
  return {
    channel,
    figures,
    findings: judgement.findings.filter((finding) => finding.channel === channelName),
    passes: judged?.passes === true,
    path,
    nominal: referenceHz === null ? path.total : relativeTo(path.total, referenceHz),
    largest: worstPath(path, { sense: 'largest', referenceHz, axis: 'hertz' }).response,
    placeOf: (steps) => nearestPlace(judgement, channelName, steps),
  };
}

/** The figure of a limit, judged or not; null where the channel does not state it. */
export function limitFigure(subject: Subject, key: JudgedKey): LimitFigure | null {
  return subject.figures.limits.find((figure) => figure.limit === key) ?? null;
}

/** What the channel samples or rebuilds with, by its key. */
export function pulseKey({ direction, gate }: Channel): 'aperture' | 'hold' | 'gate' {
  if (direction === 'capture') return 'aperture';
  return gate === null ? 'hold' : 'gate';
}

/** Where the filter stands: the only one, or of a relay channel's two the one behind the sampler, where both are stated. */
export function filterPlace({ channel, placeOf }: Subject): PlaceName | null {
  if (channel.direction !== 'relay') return placeOf(['filter']);
  return placeOf(['output-filter']) ?? placeOf(['input-filter']);
}

function nearestPlace({ reading }: Judgement, channel: string, steps: PlaceName['path']): PlaceName | null {
  for (let length = steps.length; length > 0; length -= 1) {
    const place = { channel, path: steps.slice(0, length) };
    if (exists(reading, place)) return place;
  }
  return null;
}
