/** The groups of outside values, in the order of the printed table. */
import type { OutsideGroup } from '../group';
import { bandwidths, passive } from './bandwidths';
import { folds, windows } from './folding';
import { delays, holdValues, narrowGates, pulses, trains } from './holds';
import { holdJitter } from './hold-jitter';
import { masks } from './masks';
import { orders } from './orders';
import { printedBessel, printedTables } from './printed';
import { printedBandwidths } from './printed-bandwidths';
import { prototypes } from './prototypes';
import { kinds, responses } from './responses';
import { systemCases } from './system-cases';
import { touchstone } from './touchstone';
import { brickWalls, toOrderTwenty } from './to-order-twenty';

export const groups: readonly OutsideGroup[] = [
  pulses,
  holdValues,
  trains,
  narrowGates,
  delays,
  holdJitter,
  folds,
  windows,
  toOrderTwenty,
  brickWalls,
  prototypes,
  responses,
  kinds,
  printedTables,
  printedBessel,
  bandwidths,
  printedBandwidths,
  passive,
  orders,
  touchstone,
  masks,
  systemCases,
];
