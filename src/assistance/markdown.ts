/** Text of the description that is shown in Markdown: nothing in it is markup. */
export const plainText = (text: string): string => text.replace(/[\\`*_{}[\]()#+\-.!|<>~&]/g, '\\$&');

/** Two columns of a table without a head that matters. */
export const rowsTable = (rows: readonly (readonly [string, string])[]): string =>
  ['| | |', '|:--|:--|', ...rows.map(([name, value]) => `| ${name} | ${value} |`)].join('\n');
