/** What the other layers use of pictures. */
export { pictureOf } from './picture-of';
