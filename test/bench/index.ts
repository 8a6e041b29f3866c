/** `npm run bench`: every figure is a ratio within this one run. */
import { benchReading } from './reading';

benchReading();
