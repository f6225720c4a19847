import { readFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { chromium, type Browser, type Page } from 'playwright-core';
import { pageHtml } from '../../src/messages/pageHtml';
import { chromiumArguments, prepareChromium } from '../host/preparePrograms';
import type { ToHost, ToPage } from '../../src/messages/panel';
import { bodyClass, themeVariables, type ThemeKind } from './themes';

const dist = new URL('../../dist/', import.meta.url);
const nonce = 'bm9uY2UtZm9yLXRlc3Rz';

/** Stands in for the editor: keeps what the page says and what it wants remembered. Runs under the page's own policy. */
const standIn = `
  window.said = []; window.remembered = null; window.violations = [];
  document.addEventListener('securitypolicyviolation', (event) => window.violations.push(event.violatedDirective + ' ' + event.blockedURI + ' ' + event.sample));
  window.acquireVsCodeApi = () => ({ postMessage: (message) => window.said.push(message), setState: (state) => { window.remembered = state; }, getState: () => window.remembered });
`;

export interface ServedPage {
  readonly page: Page;
  post(message: ToPage | object | string | number | null): Promise<void>;
  said(): Promise<ToHost[]>;
  violations(): Promise<string[]>;
}

let server: Server | null = null;
let browser: Browser | null = null;

export async function startPages(): Promise<void> {
  server = createServer((request, response) => {
    const path = new URL(request.url ?? '/', 'http://page').pathname;
    const send = (type: string, body: string | Buffer) => {
      response.setHeader('content-type', type);
      response.end(body);
    };
    if (path === '/webview.js') return send('text/javascript', readFileSync(new URL('webview.js', dist)));
    if (path === '/webview.css') return send('text/css', readFileSync(new URL('webview.css', dist)));
    const html = pageHtml({ nonce, cspSource: "'self'", scriptUri: '/webview.js', styleUri: '/webview.css' });
    const plain = new URL(request.url ?? '/', 'http://page').searchParams.has('plain');
    return send('text/html', (plain ? html.replace('id="panel"', 'id="panel" data-controls="plain"') : html).replace('<link', `<script nonce="${nonce}">${standIn}</script><link`));
  });
  await new Promise<void>((ready) => server!.listen(0, '127.0.0.1', ready));
  browser = await chromium.launch({ executablePath: await prepareChromium(), headless: true, args: chromiumArguments });
}

export async function stopPages(): Promise<void> {
  await browser?.close();
  server?.close();
}

export async function openPage(theme: ThemeKind, width: number, controls: 'toolkit' | 'plain' = 'toolkit'): Promise<ServedPage> {
  const page = await browser!.newPage({ viewport: { width, height: 900 } });
  await page.goto(`http://127.0.0.1:${(server!.address() as AddressInfo).port}/${controls === 'plain' ? '?plain' : ''}`);
  await page.evaluate(({ classes, variables }) => {
    document.body.className = classes;
    for (const [name, value] of Object.entries(variables)) document.documentElement.style.setProperty(name, value);
  }, { classes: bodyClass[theme], variables: themeVariables[theme] });
  return {
    page,
    async post(message) {
      await page.evaluate((data) => window.postMessage(data, '*'), message as never);
      await page.evaluate(() => new Promise<void>((done) => requestAnimationFrame(() => requestAnimationFrame(() => setTimeout(done, 0)))));
    },
    said: () => page.evaluate(() => (window as unknown as { said: ToHost[] }).said),
    violations: () => page.evaluate(() => (window as unknown as { violations: string[] }).violations),
  };
}

/** A page of its own, for a file. */
export const openBlank = (width: number): Promise<Page> => browser!.newPage({ viewport: { width, height: 900 } });
