/** `npm run bench`: every figure is a ratio within this one run. */
import { benchKernel } from './kernel';
import { benchReading } from './reading';

benchKernel();
benchReading();
