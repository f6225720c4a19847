import { readFile } from 'node:fs/promises';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import { prepareWebEditor } from '../prepareEditor';
import { argument, openEditorPage, runAsProgram } from './editorPage';

const TYPES: Readonly<Record<string, string>> = {
  '.js': 'text/javascript', '.mjs': 'text/javascript', '.css': 'text/css', '.html': 'text/html', '.json': 'application/json', '.wasm': 'application/wasm', '.svg': 'image/svg+xml', '.ttf': 'font/ttf',
};

const startPage = (port: number, suite: string) => `<!DOCTYPE html><html lang="en"><head><meta charset="utf-8"><title>editor</title>
<link rel="stylesheet" href="/out/vs/workbench/workbench.web.main.internal.css"></head><body><script type="module">
globalThis._VSCODE_FILE_ROOT = location.origin + '/out/';
await import('/out/nls.messages.js');
const { default: start } = await import('/workbench.js');
const views = 'http://{{uuid}}.localhost:${port}/out/vs/workbench/contrib/webview/browser/pre';
const uri = (path) => ({ scheme: 'http', authority: location.host, path });
start(document.body, {
  productConfiguration: { nameShort: 'editor', nameLong: 'editor', applicationName: 'editor', dataFolderName: '.editor', quality: 'stable',
    webEndpointUrlTemplate: location.origin, webviewContentExternalBaseUrlTemplate: views + '/', extensionEnabledApiProposals: {} },
  webviewEndpoint: views,
  configurationDefaults: { 'workbench.startupEditor': 'none', 'security.workspace.trust.enabled': false, 'workbench.secondarySideBar.defaultVisibility': 'hidden' },
  developmentOptions: { extensions: [uri('/extension')], extensionTestsPath: uri('/extension/${suite}') },
});
</script></body></html>`;

/** Serves the editor, the extension and the suite from loopback; in the suite, `__BRIDGE__` becomes the bridge's address. */
async function serve(editor: string, extension: string, suite: string, bridgeUrl: string): Promise<Server> {
  const server = createServer((request, response) => {
    const port = (server.address() as AddressInfo).port;
    const wanted = decodeURIComponent(new URL(request.url ?? '/', 'http://localhost').pathname);
    response.setHeader('access-control-allow-origin', '*');
    if (wanted === '/') {
      response.setHeader('content-type', 'text/html');
      response.end(startPage(port, suite));
      return;
    }
    const [, area, ...rest] = wanted.split('/');
    const [folder, names] = area === 'extension' ? [extension, rest] : [editor, [area, ...rest]];
    if (names.includes('..')) {
      response.writeHead(404).end();
      return;
    }
    const file = path.join(folder, ...names);
    readFile(file).then(
      (content) => {
        response.setHeader('content-type', TYPES[path.extname(file)] ?? 'application/octet-stream');
        response.end(area === 'extension' && rest.join('/') === suite ? content.toString().replaceAll('__BRIDGE__', bridgeUrl) : content);
      },
      () => response.writeHead(404).end(),
    );
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return server;
}

/** The editor's web build, whose extension host is a worker without Node, as a program like the served editor. */
async function main(): Promise<number> {
  const [extension, tests] = [argument('extensionDevelopmentPath'), argument('extensionTestsPath')];
  const folder = await prepareWebEditor();
  const editor = await openEditorPage({ quiet: true });
  // The editor runs a suite in the host of the extension that it lies in. It takes a name in .cjs for CommonJS.
  const suite = path.relative(extension, path.join(path.dirname(tests), 'webSuite.cjs')).split(path.sep).join('/');
  const server = await serve(folder, extension, suite, editor.bridge.url);
  try {
    return await editor.run(`http://localhost:${(server.address() as AddressInfo).port}/`);
  } finally {
    await editor.close();
    server.closeAllConnections();
    server.close();
  }
}

runAsProgram(main);
