import assert from 'node:assert/strict';
import * as vscode from 'vscode';

describe('the editor', () => {
  it('has the extension', () => {
    assert.ok(vscode.extensions.getExtension('ohmward.ohmward'));
  });
});
