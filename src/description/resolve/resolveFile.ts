import type { Located } from '../../base/span';
import type { NetworkData } from '../../network/networkData';
import { doubtAt, problemAt, type Resolution } from './resolution';

/** Data of a Touchstone file, or why there are none. */
export type FileOutcome = { readonly data: NetworkData; readonly reason: null } | { readonly data: null; readonly reason: string };

/** Looks a Touchstone file up; one that is missing or cannot be used is an error at the path. */
export function resolveFile(path: Located<string>, { files, report }: Pick<Resolution, 'files' | 'report'>): FileOutcome {
  const file = files.get(path.value);
  if (!file) return { data: null, reason: `${path.value} has not been read yet` };
  const refuse = (code: string, message: string, reason: string): FileOutcome => {
    report(problemAt(code, message, path.span));
    return { data: null, reason };
  };
  switch (file.form) {
    case 'touchstone':
      for (const warning of file.warnings) report(doubtAt('touchstone-warning', `${path.value}: ${warning}`, path.span));
      return { data: file.data, reason: null };
    case 'missing':
      return refuse('file-missing', `There is no file ${path.value}; the path is relative to this description.`, `${path.value} is missing`);
    case 'refused':
      return refuse('file-refused', `${path.value} is not read: ${file.reason}`, `${path.value} is not read`);
    case 'unreadable': {
      const line = file.line === null ? '' : `, line ${file.line}`;
      return refuse('file-unreadable', `${path.value}${line}: ${file.message}`, `${path.value} cannot be read`);
    }
    default:
      return refuse('file-unreadable', `${path.value} is not a Touchstone file.`, `${path.value} is not a Touchstone file`);
  }
}
