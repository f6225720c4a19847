/** Theme variables as the editor hands them to a page: rough copies of the four kinds, enough to judge contrast. */
export type ThemeKind = 'dark' | 'light' | 'high contrast' | 'high contrast light';

export const bodyClass: Readonly<Record<ThemeKind, string>> = {
  dark: 'vscode-dark', light: 'vscode-light', 'high contrast': 'vscode-high-contrast', 'high contrast light': 'vscode-high-contrast vscode-high-contrast-light',
};

const shared = { '--vscode-font-size': '13px', '--vscode-font-family': '"DejaVu Sans", sans-serif' };

export const themeVariables: Readonly<Record<ThemeKind, Readonly<Record<string, string>>>> = {
  dark: {
    ...shared, '--vscode-foreground': '#cccccc', '--vscode-editor-foreground': '#cccccc', '--vscode-editor-background': '#1f1f1f', '--vscode-descriptionForeground': '#9d9d9d',
    '--vscode-widget-border': '#3c3c3c', '--vscode-testing-iconPassed': '#73c991', '--vscode-errorForeground': '#f85149', '--vscode-editorWarning-foreground': '#cca700',
    '--vscode-charts-blue': '#3794ff', '--vscode-charts-orange': '#d18616', '--vscode-charts-green': '#89d185', '--vscode-charts-purple': '#b180d7', '--vscode-charts-red': '#f14c4c',
    '--vscode-focusBorder': '#0078d4', '--vscode-input-background': '#313131', '--vscode-input-foreground': '#cccccc', '--vscode-button-background': '#0078d4', '--vscode-button-foreground': '#ffffff',
    '--vscode-button-secondaryBackground': '#313131', '--vscode-button-secondaryForeground': '#cccccc', '--vscode-list-hoverBackground': '#2a2d2e',
  },
  light: {
    ...shared, '--vscode-foreground': '#3b3b3b', '--vscode-editor-foreground': '#3b3b3b', '--vscode-editor-background': '#ffffff', '--vscode-descriptionForeground': '#5f5f5f',
    '--vscode-widget-border': '#d4d4d4', '--vscode-testing-iconPassed': '#1a7f37', '--vscode-errorForeground': '#b3261e', '--vscode-editorWarning-foreground': '#8a6100',
    '--vscode-charts-blue': '#0a61b0', '--vscode-charts-orange': '#a85a00', '--vscode-charts-green': '#388a34', '--vscode-charts-purple': '#652d90', '--vscode-charts-red': '#b3261e',
    '--vscode-focusBorder': '#005fb8', '--vscode-input-background': '#ffffff', '--vscode-input-foreground': '#3b3b3b', '--vscode-input-border': '#cecece', '--vscode-button-background': '#005fb8',
    '--vscode-button-foreground': '#ffffff', '--vscode-button-secondaryBackground': '#e5e5e5', '--vscode-button-secondaryForeground': '#3b3b3b', '--vscode-list-hoverBackground': '#f2f2f2',
  },
  'high contrast': {
    ...shared, '--vscode-foreground': '#ffffff', '--vscode-editor-foreground': '#ffffff', '--vscode-editor-background': '#000000', '--vscode-descriptionForeground': '#e0e0e0', '--vscode-contrastBorder': '#6fc3df',
    '--vscode-contrastActiveBorder': '#f38518', '--vscode-testing-iconPassed': '#73c991', '--vscode-errorForeground': '#f48771', '--vscode-editorWarning-foreground': '#ffd370', '--vscode-focusBorder': '#f38518',
    '--vscode-input-background': '#000000', '--vscode-input-foreground': '#ffffff', '--vscode-input-border': '#6fc3df', '--vscode-button-foreground': '#ffffff', '--vscode-button-secondaryForeground': '#ffffff',
    '--vscode-button-border': '#6fc3df', '--vscode-button-secondaryBackground': '#000000',
  },
  'high contrast light': {
    ...shared, '--vscode-foreground': '#292929', '--vscode-editor-foreground': '#292929', '--vscode-editor-background': '#ffffff', '--vscode-descriptionForeground': '#292929', '--vscode-contrastBorder': '#0f4a85',
    '--vscode-contrastActiveBorder': '#006bbd', '--vscode-testing-iconPassed': '#1a6b2e', '--vscode-errorForeground': '#b5200d', '--vscode-editorWarning-foreground': '#6f4e00', '--vscode-focusBorder': '#006bbd',
    '--vscode-input-background': '#ffffff', '--vscode-input-foreground': '#292929', '--vscode-input-border': '#0f4a85', '--vscode-button-background': '#0f4a85', '--vscode-button-foreground': '#ffffff',
    '--vscode-button-secondaryBackground': '#ffffff', '--vscode-button-secondaryForeground': '#292929', '--vscode-button-border': '#0f4a85',
  },
};
