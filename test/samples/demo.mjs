// The main job on the sample: check, sweep, a report to open. Run by `npm run demo` after the build.
import { spawnSync } from 'node:child_process';
import { mkdirSync } from 'node:fs';

const sample = 'media/samples/orchard/frost.match.yaml';
mkdirSync('out/demo', { recursive: true });

function ohmward(...words) {
  console.log(`\n$ ohmward ${words.join(' ')}`);
  const { status, error } = spawnSync(process.execPath, ['dist/ohmward.cjs', ...words], { stdio: 'inherit' });
  if (error || status !== 0) {
    console.error(`this ended with ${error ?? `exit code ${status}`}`);
    process.exit(1);
  }
}

ohmward('check', 'media/samples');
ohmward('sweep', sample, '--case', 'wet bark');
ohmward('sweep', sample, '--format', 'touchstone', '-o', 'out/demo/');
ohmward('codes', '--verify', 'media/samples');
ohmward('report', 'media/samples', '-o', 'out/demo/report.html');
console.log(`
Open out/demo/report.html in a browser.
In the editor: open this folder in VS Code and press F5 (a second window opens on the sample workspace), or run
«npm run package» and install the .vsix. Then open ${sample.split('/').slice(2).join('/')}
and press the chart's icon at the top right («Open the panel beside the editor»).`);
