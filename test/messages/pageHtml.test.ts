import assert from 'node:assert/strict';
import { pageHtml } from '../../src/messages/pageHtml';

describe('the page of the panel', () => {
  const html = pageHtml({ nonce: 'abc123', cspSource: 'vscode-resource:', scriptUri: 'vscode-resource:/webview.js', styleUri: 'vscode-resource:/webview.css' });

  it('allows its own script and style and nothing else', () => {
    const policy = /http-equiv="Content-Security-Policy" content="([^"]*)"/.exec(html)![1];
    assert.match(policy, /^default-src 'none';/);
    assert.match(policy, /script-src 'nonce-abc123'(;|$)/);
    assert.doesNotMatch(policy, /unsafe|\*|https?:|data:/);
  });

  it('has no script or style of its own in it', () => {
    for (const [, attributes, content] of html.matchAll(/<(?:script|style)\b([^>]*)>([^<]*)/g)) {
      assert.match(attributes, /nonce="abc123"/);
      assert.equal(content.trim(), '');
    }
    assert.doesNotMatch(html, /\son\w+=/);
  });

  it('lets no address break out of its place', () => {
    const hostile = pageHtml({ nonce: 'n', cspSource: 's', scriptUri: '"><script>alert(1)</script>', styleUri: '"&<x>' });
    assert.doesNotMatch(hostile, /<script>alert|"><script|<x>/);
  });
});
