/** The editor's theme as a drawing needs it: read from the workbench's CSS variables, read again whenever the body's class or style changes. */
import { paperTheme } from '../drawing/theme';
import type { Theme } from '../drawing/theme';

/** The theme that the page wears now. */
export function readTheme(): Theme {
  const style = getComputedStyle(document.body);
  const fallback = isDark() ? darkFallback : paperTheme;
  const pick = (key: keyof typeof variables): string => {
    const set = variables[key].map((name) => style.getPropertyValue(name).trim()).find((value) => value !== '');
    return set ?? fallback[key];
  };
  const fontPx = Number.parseFloat(style.getPropertyValue('--vscode-font-size')) || paperTheme.fontPx;
  return {
    background: pick('background'),
    text: pick('text'),
    muted: pick('muted'),
    grid: pick('grid'),
    wanted: pick('wanted'),
    source: pick('source'),
    harm: pick('harm'),
    good: pick('good'),
    path: pick('path'),
    noise: pick('noise'),
    focus: pick('focus'),
    fontFamily: style.getPropertyValue('--vscode-font-family').trim() || paperTheme.fontFamily,
    fontPx: Math.min(16, Math.max(11, fontPx - 1)),
    highContrast: isHighContrast() ? 'yes' : 'no',
  };
}

/** Calls back after each change of theme; gives a function that ends it. */
export function watchTheme(changed: (theme: Theme) => void): () => void {
  const observer = new MutationObserver(() => {
    changed(readTheme());
  });
  observer.observe(document.body, { attributes: true, attributeFilter: ['class', 'style'] });
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['class', 'style'] });
  return () => {
    observer.disconnect();
  };
}

const variables = {
  background: ['--vscode-editor-background'],
  text: ['--vscode-editor-foreground', '--vscode-foreground'],
  muted: ['--vscode-descriptionForeground'],
  grid: ['--vscode-editorWidget-border', '--vscode-panel-border'],
  wanted: ['--vscode-charts-blue'],
  source: ['--vscode-charts-orange'],
  harm: ['--vscode-charts-red', '--vscode-errorForeground'],
  good: ['--vscode-charts-green'],
  path: ['--vscode-charts-foreground', '--vscode-foreground'],
  noise: ['--vscode-charts-purple'],
  focus: ['--vscode-contrastActiveBorder', '--vscode-focusBorder'],
} as const satisfies Partial<Record<keyof Theme, readonly string[]>>;

const darkFallback: Theme = {
  ...paperTheme,
  background: '#1f1f1f',
  text: '#e4e4e4',
  muted: '#a3a3a3',
  grid: '#3a3a3a',
  wanted: '#4c9df0',
  source: '#d9912b',
  harm: '#f2585b',
  good: '#7cc27f',
  path: '#c4c4c4',
  noise: '#b59ae0',
  focus: '#4c9df0',
};

function isDark(): boolean {
  const { classList } = document.body;
  const darkContrast = classList.contains('vscode-high-contrast') && !classList.contains('vscode-high-contrast-light');
  return classList.contains('vscode-dark') || darkContrast;
}

function isHighContrast(): boolean {
  return (
    document.body.classList.contains('vscode-high-contrast') || document.body.classList.contains('vscode-high-contrast-light')
  );
}
