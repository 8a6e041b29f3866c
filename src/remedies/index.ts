/** What the other layers use of remedies: the search for proved fixes. */
export { cure, curing } from './curing';
export type { Cure, Fix } from './fix';
export { targetOf } from './trial';
