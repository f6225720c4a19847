export interface PageResources {
  /** From a source of true randomness; the same for all of this page. */
  readonly nonce: string;
  /** The editor's word for its own resources in a policy. */
  readonly cspSource: string;
  readonly scriptUri: string;
  readonly styleUri: string;
}

const escaped = (text: string) => text.replace(/[&"<>]/g, (character) => `&#${character.charCodeAt(0)};`);

/** The panel's page: nothing in it but places for the script and the style, under a policy that allows just these two. */
export function pageHtml({ nonce, cspSource, scriptUri, styleUri }: PageResources): string {
  const policy = [
    "default-src 'none'",
    `style-src ${cspSource} 'nonce-${nonce}'`,
    `script-src 'nonce-${nonce}'`,
    `img-src ${cspSource} blob:`,
    `font-src ${cspSource}`,
  ].join('; ');
  return `<!DOCTYPE html>
<html lang="en">
<head>
  <meta charset="utf-8">
  <meta http-equiv="Content-Security-Policy" content="${escaped(policy)}">
  <meta property="csp-nonce" content="${escaped(nonce)}">
  <meta name="viewport" content="width=device-width, initial-scale=1">
  <title>Ohmward</title>
  <link rel="stylesheet" nonce="${escaped(nonce)}" href="${escaped(styleUri)}">
</head>
<body>
  <main id="panel"></main>
  <script nonce="${escaped(nonce)}" src="${escaped(scriptUri)}"></script>
</body>
</html>
`;
}
