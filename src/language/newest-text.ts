/** The newest text of an open spec, read when that is asked for, with all taken over that neither the text nor its files have changed. */
import { read, type FileSource, type Reading } from '../spec';

/** One spec's newest text. */
export class NewestText {
  /** Goes up with every newer text and with every change of a file that it leans on. */
  revision = 0;
  private reading: Reading | null = null;
  private revisionRead = -1;

  /** @param files those that the spec names, as far as they have been loaded; none for a text that stands alone */
  constructor(
    public version: number,
    public text: string,
    private readonly files: FileSource | undefined,
  ) {}

  change(version: number, text: string): void {
    this.version = version;
    this.text = text;
    this.revision += 1;
  }

  refresh(): void {
    this.revision += 1;
  }

  /** The other files that the text last read leans on, from its root. */
  get paths(): readonly string[] {
    return this.reading?.paths ?? [];
  }

  /** Reads with the files as they are now. */
  read(): Reading {
    // A text that leans on nothing cannot read otherwise than before.
    const same = this.reading?.text === this.text && this.reading.paths.length === 0;
    if (this.reading === null || !same) this.reading = read(this.text, this.reading ?? undefined, this.files);
    this.revisionRead = this.revision;
    return this.reading;
  }

  /** The reading of this revision, made where there is none yet. */
  current(): Reading {
    return this.reading !== null && this.revisionRead === this.revision ? this.reading : this.read();
  }
}
