/** What the analysis offers to the other layers: figures of a channel, and its path as responses. */
export { analyse } from './analyse';
export { createFigureStore, type FigureStore } from './figure-store';
export type {
  AliasFigure,
  Figures,
  ImageFigure,
  JudgedKey,
  LimitFigure,
  MaskFigure,
  MaskOrigin,
  NoiseFigures,
  Overlap,
  SamplingFault,
  WantedFigure,
  Where,
  WorstAt,
} from './figures';
export {
  channelPath,
  gainDb,
  inSeries,
  lossDb,
  pathDelay,
  pathPhaseRad,
  relativeTo,
  type ChannelPath,
  type StagePath,
} from './channel-path';
export { relayPath } from './relay/relay-path';
export { weightResponse } from './relay/weights';
export { hasPulse, wantedPhaseRad } from './wanted-pulse';
export { rateWindowsOf, type RateTable, type RateWindow } from './rate-windows';
export { keepsWhole } from './wanted';
export type { Axis } from './axis';
export type { WorstQuestion } from './stretched-from';
export { worstPath, type WorstPath } from './worst-path';
export { halfPowerPoints } from './half-power-points';
export { noiseWidth, type NoiseWidth } from './noise-width';
export { gateFigures, gateResponse, stretchedGate, type GateFigures } from './gate-figures';
export { shapeNulls } from './pulse-nulls';
export { toneLandings } from './tone-landings';
export { pulseShape, widthSeconds } from './pulse-shape';
export { pulseDelay } from '../signal/pulses/pulse-delay';
export { trackAndHoldDelay, type TrackAndHold } from '../signal/pulses/track-and-hold';
export { trackAndHoldCopy } from '../signal/pulses/track-and-hold-copy';
export { pulseNulls, pulseSeconds } from './pulse';
export { jitterNoiseDb, quantisationSnrDb } from '../signal/noise';
export { foldFrequency, type Landing } from '../signal/folding';
export type { Enclosure, Response } from '../signal/response';
