import { existsSync } from 'node:fs';
import { mkdir, readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';
import { chromiumArguments, prepareChromium } from './preparePrograms';

/** The README's picture: the window that the suite took, made small. `npm run pictures` runs the suite before. */
const taken = fileURLToPath(new URL('../../out/pictures/panel-first.png', import.meta.url));
const folder = fileURLToPath(new URL('../../media/pictures/', import.meta.url));
const quality = 66;

if (!existsSync(taken)) throw new Error('out/pictures/panel-first.png is not there: run the suite «panel» first');
const browser = await chromium.launch({ executablePath: await prepareChromium(), args: chromiumArguments });
const page = await browser.newPage({ viewport: { width: 1400, height: 900 } });
await page.setContent(`<style>body{margin:0}</style><img src="data:image/png;base64,${(await readFile(taken)).toString('base64')}">`);
await mkdir(folder, { recursive: true });
await page.screenshot({ path: `${folder}panel.jpg`, type: 'jpeg', quality });
await browser.close();
