/** A path written in one file, seen from where that file's own path starts: `../x.s2p` in `parts/stock.csv` is `x.s2p`. */
export function pathBeside(file: string, written: string): string {
  if (/^(\/|[A-Za-z]:[\\/])/.test(written)) return written;
  const folders = file.split('/').slice(0, -1);
  for (const step of written.split('/')) {
    if (step === '.' || step === '') continue;
    const last = folders[folders.length - 1];
    if (step === '..' && last !== undefined && last !== '..' && last !== '.') folders.pop();
    else folders.push(step);
  }
  return folders.join('/');
}
