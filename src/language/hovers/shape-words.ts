/** What a pulse is called where its width follows. */
import type { Pulse } from '../../spec';

/** "Half sine of ", or nothing for a plain rectangle. */
export function shapeWords({ shape }: Pulse): string {
  switch (shape) {
    case 'instant':
    case 'rectangle':
      return '';
    case 'linear':
      return 'Straight lines from sample to sample, ';
    case 'triangle':
      return 'Triangle of ';
    case 'half-sine':
      return 'Half sine of ';
    case 'raised-cosine':
      return 'Raised cosine of ';
    case 'trapezoid':
      return 'Trapezoid of ';
    case 'exponential':
      return 'Decaying pulse of ';
    case 'split':
      return 'Split pulse of ';
  }
}
