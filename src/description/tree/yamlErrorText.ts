import type { YAMLError } from 'yaml';

/** What an error of the YAML reader means here, in our words; `before` and `rest` are the text up to it and the line from it on. */
export function yamlErrorText(error: Pick<YAMLError, 'code' | 'message'>, before: string, rest: string): { code: string; message: string } {
  const { code, message } = error;
  if (code === 'TAB_AS_INDENT') return { code: 'tab', message: 'YAML does not allow a tab as indentation; use spaces.' };
  if (/Missing closing/.test(message)) return { code: 'unclosed-quote', message: 'A quotation mark before this is never closed.' };
  if (code === 'BAD_DQ_ESCAPE') {
    return { code: 'bad-escape', message: 'No such escape inside double quotes; double the backslash, or use single quotes.' };
  }
  if (/^Flow (sequence|map)/.test(message) || /must be sufficiently indented and end with/.test(message)) {
    return { code: 'unclosed-bracket', message: 'A bracket or brace is not closed, or its end stands too far left.' };
  }
  if (code === 'BLOCK_IN_FLOW') return { code: 'block-in-flow', message: 'Lines with dashes or keys of their own cannot stand inside brackets or braces.' };
  if (/Missing , /.test(message)) return { code: 'missing-comma', message: 'A comma is missing between two entries inside brackets or braces; a phrase with a bracket in it stands in quotes there.' };
  if (/Missing space after :/.test(message)) return { code: 'missing-space', message: 'A space is missing after the colon.' };
  if (code === 'MULTILINE_IMPLICIT_KEY' || /Implicit map keys need/.test(message)) {
    return { code: 'missing-colon', message: 'A key and a colon with a space after it are expected here, as in «z0: 50 Ω».' };
  }
  if (/Sequence item without - indicator/.test(message) || /All sequence items/.test(message)) {
    return { code: 'bad-indentation', message: 'The lines of a list all begin with a dash at the same column.' };
  }
  if (code === 'BLOCK_AS_IMPLICIT_KEY' && /sequence/.test(message)) {
    return { code: 'bad-indentation', message: 'The dash here fits no list above it; indent it like the other dashes of its list.' };
  }
  if (code === 'BLOCK_AS_IMPLICIT_KEY' && !/:(\s|$)/.test(rest)) {
    return { code: 'bad-indentation', message: 'Indented lines with keys of their own follow this phrase: a key holds either a phrase or the lines below it.' };
  }
  if (code === 'BLOCK_AS_IMPLICIT_KEY') return { code: 'second-colon', message: 'A second key on one line; put the phrase in quotes, or begin a new line.' };
  if (code === 'BAD_INDENT') return { code: 'bad-indentation', message: 'The indentation here fits nothing above it.' };
  if (/in YAML stream/.test(message) || (/at node end/.test(message) && !/["'\]}]\s*$/.test(before))) {
    return { code: 'not-yaml', message: 'This does not fit what stands above it, and YAML reads nothing from here on; check brackets, quotation marks and indentation above.' };
  }
  if (/at node end/.test(message)) return { code: 'text-after-end', message: 'Nothing may follow a closing quotation mark, bracket or brace; put the whole phrase in quotes.' };
  if (code === 'BAD_SCALAR_START') return { code: 'phrase-start', message: 'A phrase cannot start with this sign in YAML; put it in quotes.' };
  if (/block-seq-ind|same line with/.test(message)) return { code: 'phrase-start', message: 'A dash with a space after it begins a list, which stands on lines of its own; put a phrase in quotes.' };
  if (/Block scalar header/.test(message)) return { code: 'phrase-start', message: 'A phrase that starts with «|» or «>» begins a block of text in YAML; put it in quotes.' };
  if (code === 'KEY_OVER_1024_CHARS') return { code: 'key-too-long', message: 'A key of more than 1024 characters is none that is known here.' };
  if (code === 'MISSING_CHAR' && /Comments must be separated/.test(message)) return { code: 'comment-space', message: 'A comment needs a space before its «#».' };
  if (code === 'BAD_DIRECTIVE' || /directives-end/.test(message)) return { code: 'yaml-directive', message: 'A line that starts with «%» is for YAML itself and not for a match description.' };
  if (/Unexpected , in|Unexpected empty item/.test(message)) return { code: 'stray-comma', message: 'A comma without an entry before it.' };
  return { code: 'not-yaml', message: 'YAML cannot read this. Check the indentation, the space after colons, and quotation marks and brackets.' };
}
