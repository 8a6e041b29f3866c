/** Starts the panel's page: opens the door to the extension, follows the theme, and says that it is ready. */
import { openHost } from './host';
import { readTheme, watchTheme } from './page-theme';
import { Panel } from './panel';

const host = openHost();
const panel = new Panel(host, readTheme());

/** Whatever goes wrong is told to the extension, whose log keeps it; the page goes on. */
function guarded(act: () => void): void {
  try {
    act();
  } catch (fault) {
    host.post({ kind: 'failed', message: fault instanceof Error ? `${fault.message}\n${fault.stack ?? ''}` : String(fault) });
  }
}

host.listen((message) => {
  guarded(() => {
    panel.take(message);
  });
});
watchTheme((theme) => {
  guarded(() => {
    panel.wear(theme);
  });
});
host.post({ kind: 'ready' });
