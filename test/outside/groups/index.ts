/** The groups of outside values, in the order of the printed table. */
import type { OutsideGroup } from '../group';
import { bandwidths, passive } from './bandwidths';
import { folds, windows } from './folding';
import { delays, holdValues, narrowGates, pulses, trains } from './holds';
import { holdJitter } from './hold-jitter';
import { lcLadders, printedLcLadders } from './lc-ladders';
import { masks } from './masks';
import { optimumL } from './optimum-l';
import { orders } from './orders';
import { printedBessel, printedTables } from './printed';
import { printedBandwidths } from './printed-bandwidths';
import { printedSectionTables } from './printed-sections';
import { prototypes } from './prototypes';
import { printedRcLadders, rcLadders } from './rc-ladders';
import { kinds, responses } from './responses';
import { printedSteps, steps } from './steps';
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
  optimumL,
  bandwidths,
  printedBandwidths,
  passive,
  rcLadders,
  printedRcLadders,
  printedSectionTables,
  lcLadders,
  printedLcLadders,
  steps,
  printedSteps,
  orders,
  touchstone,
  masks,
  systemCases,
];
