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
  lossDb,
  pathDelay,
  pathPhaseRad,
  relativeTo,
  type ChannelPath,
  type StagePath,
} from './channel-path';
export { worstPath, type Axis, type WorstPath, type WorstQuestion } from './worst-path';
export { halfPowerHz } from './half-power';
export { noiseBandwidthHz } from './noise-bandwidth';
export { pulseNulls, pulseSeconds } from './pulse';
export { jitterNoiseDb, quantisationSnrDb } from '../signal/noise';
export { foldFrequency, type Landing } from '../signal/folding';
export type { Enclosure, Response } from '../signal/response';
