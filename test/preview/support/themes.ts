/** Variables of three of the workbench's own colour themes, as far as the page reads them. */

/** A theme as the workbench hands it to a page: the body's classes and the root's variables. */
export interface WorkbenchTheme {
  readonly classes: readonly string[];
  readonly variables: Readonly<Record<string, string>>;
}

const font = {
  '--vscode-font-family': 'system-ui, "Ubuntu", "DejaVu Sans", sans-serif',
  '--vscode-font-size': '13px',
};

/** The three themes that screenshots are taken in. */
export const themes = {
  light: {
    classes: ['vscode-light'],
    variables: {
      ...font,
      '--vscode-editor-background': '#ffffff',
      '--vscode-editor-foreground': '#3b3b3b',
      '--vscode-foreground': '#3b3b3b',
      '--vscode-descriptionForeground': '#616161',
      '--vscode-panel-border': '#e5e5e5',
      '--vscode-focusBorder': '#005fb8',
      '--vscode-textLink-foreground': '#005fb8',
      '--vscode-errorForeground': '#f85149',
      '--vscode-charts-foreground': '#3b3b3b',
      '--vscode-charts-blue': '#0063d3',
      '--vscode-charts-orange': '#d18616',
      '--vscode-charts-red': '#e51400',
      '--vscode-charts-green': '#388a34',
      '--vscode-charts-purple': '#652d90',
      '--vscode-editorHoverWidget-background': '#f8f8f8',
      '--vscode-editorHoverWidget-border': '#c8c8c8',
    },
  },
  dark: {
    classes: ['vscode-dark'],
    variables: {
      ...font,
      '--vscode-editor-background': '#1f1f1f',
      '--vscode-editor-foreground': '#cccccc',
      '--vscode-foreground': '#cccccc',
      '--vscode-descriptionForeground': '#9d9d9d',
      '--vscode-panel-border': '#2b2b2b',
      '--vscode-focusBorder': '#0078d4',
      '--vscode-textLink-foreground': '#4daafc',
      '--vscode-charts-foreground': '#cccccc',
      '--vscode-charts-blue': '#3794ff',
      '--vscode-charts-orange': '#d18616',
      '--vscode-charts-red': '#f14c4c',
      '--vscode-charts-green': '#89d185',
      '--vscode-charts-purple': '#b180d7',
      '--vscode-editorHoverWidget-background': '#202020',
      '--vscode-editorHoverWidget-border': '#454545',
    },
  },
  'high-contrast': {
    classes: ['vscode-high-contrast'],
    variables: {
      ...font,
      '--vscode-editor-background': '#000000',
      '--vscode-editor-foreground': '#ffffff',
      '--vscode-foreground': '#ffffff',
      '--vscode-descriptionForeground': 'rgba(255, 255, 255, 0.7)',
      '--vscode-panel-border': '#6fc3df',
      '--vscode-focusBorder': '#f38518',
      '--vscode-contrastBorder': '#6fc3df',
      '--vscode-contrastActiveBorder': '#f38518',
      '--vscode-textLink-foreground': '#21a6ff',
      '--vscode-charts-foreground': '#ffffff',
      '--vscode-charts-blue': '#3794ff',
      '--vscode-charts-orange': '#d18616',
      '--vscode-charts-red': '#f48771',
      '--vscode-charts-green': '#89d185',
      '--vscode-charts-purple': '#b180d7',
      '--vscode-editorHoverWidget-background': '#0c141f',
      '--vscode-editorHoverWidget-border': '#6fc3df',
    },
  },
} as const satisfies Record<string, WorkbenchTheme>;
