/** The panel's page, set once for its life: a strict content security policy, one style sheet, one script, and the places the script fills. */

/** What the host knows of a page's surroundings. */
export interface PanelSurroundings {
  /** The source from which the workbench serves a panel's own files. */
  readonly cspSource: string;
  /** Fresh and random for every page. */
  readonly nonce: string;
  readonly scriptUri: string;
  readonly styleUri: string;
}

/** The whole document; every value is escaped, nothing is loaded from elsewhere. */
export function panelHtml(surroundings: PanelSurroundings): string {
  const { cspSource, nonce, scriptUri, styleUri } = surroundings;
  const policy = `default-src 'none'; script-src 'nonce-${nonce}'; style-src ${cspSource}; img-src ${cspSource} data:; font-src ${cspSource}`;
  return `<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta http-equiv="Content-Security-Policy" content="${escaped(policy)}">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Bandkeep</title>
<link rel="stylesheet" href="${escaped(styleUri)}">
</head>
<body>
<header id="heading"></header>
<p id="notice" role="status" hidden></p>
<main id="sections"></main>
<p id="announcer" class="unseen" aria-live="polite"></p>
<script nonce="${escaped(nonce)}" src="${escaped(scriptUri)}"></script>
</body>
</html>`;
}

function escaped(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('"', '&quot;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
