import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { openSample } from '../descriptions';
import { page } from '../page';
import { closeAll, eventually } from '../waiting';

const THEMES: [name: string, theme: string, bodyClass: string][] = [
  ['dark', 'Default Dark Modern', 'vscode-dark'],
  ['light', 'Default Light Modern', 'vscode-light'],
  ['high-contrast-dark', 'Default High Contrast', 'vscode-high-contrast'],
  ['high-contrast-light', 'Default High Contrast Light', 'vscode-high-contrast-light'],
];

describe('the panel in every kind of theme', () => {
  const settings = () => vscode.workspace.getConfiguration('workbench');

  before(async () => {
    await openSample('orchard/frost.match.yaml');
    await vscode.commands.executeCommand('ohmward.openPanel');
    await eventually('the ladder', async () => (await page.count('table.ladder tbody tr')) > 2);
  });
  after(async () => {
    await page.viewport(1400, 900);
    await settings().update('colorTheme', undefined, vscode.ConfigurationTarget.Global);
    await closeAll();
  });

  for (const [name, theme, bodyClass] of THEMES) {
    it(`${name}: no violation of accessibility rules, a picture to look at`, async () => {
      await settings().update('colorTheme', theme, vscode.ConfigurationTarget.Global);
      await eventually(`the theme's class`, () => page.evaluate<boolean>(`() => document.body.classList.contains('${bodyClass}')`));
      await new Promise((resolve) => setTimeout(resolve, 400)); // transitions of the editor's own controls
      await page.picture(`theme-${name}`);
      const violations = await page.accessibility();
      assert.deepEqual(violations.map(({ id, targets }) => `${id}: ${targets.slice(0, 4).join(' ')}`), []);
    });
  }

  it('fits half the width, as at 200 %, without a bar to scroll sideways', async () => {
    await page.viewport(760, 900);
    await new Promise((resolve) => setTimeout(resolve, 400));
    await page.picture('narrow');
    assert.equal(await page.evaluate<boolean>(`() => document.documentElement.scrollWidth <= document.documentElement.clientWidth + 1`), true);
    await page.viewport(1400, 900);
  });

  it('never broke the content security policy', async () => {
    assert.deepEqual((await page.policyViolations()).filter((text) => /webview|dist\//.test(text)), []);
  });
});
