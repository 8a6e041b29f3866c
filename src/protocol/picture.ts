/** What the panel draws, as data: sections with plots, each item with its place in the spec. */

/** All sections of one channel. */
export interface PanelPicture {
  readonly channel: string;
}
