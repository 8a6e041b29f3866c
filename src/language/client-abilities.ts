/** What the editor at the other end can show, as far as an answer depends on it. */

/** Every ability is false where the editor says nothing about it. */
export interface ClientAbilities {
  /** Diagnostics may point at related places. */
  readonly relatedInformation: boolean;
  /** Completion items may be snippets. */
  readonly snippets: boolean;
  /** Edits may name the version they were made for. */
  readonly versionedEdits: boolean;
  /** Edits may be snippets. */
  readonly snippetEdits: boolean;
  /** The menu of actions may show one that is not possible, with the reason. */
  readonly disabledActions: boolean;
  /** Hovers may be Markdown. */
  readonly markdown: boolean;
}
