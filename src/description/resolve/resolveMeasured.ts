import type { LoadCase, MeasuredTrace, Tunable } from '../../study/problem';
import type { MeasuredSyntax } from '../syntax';
import { findName } from './findName';
import { problemAt, type Resolution } from './resolution';
import { resolveElement } from './resolveElement';
import { resolveFile } from './resolveFile';

interface Names {
  readonly cases: readonly LoadCase[];
  readonly elements: readonly string[];
  readonly tunables: readonly Tunable[];
}

/** Measured traces with names and files looked up; one that names something unknown is reported and left out. */
export function resolveMeasured(syntaxes: readonly MeasuredSyntax[], { cases, elements, tunables }: Names, resolution: Resolution): MeasuredTrace[] {
  const caseNames = cases.flatMap((each) => each.name ?? []);
  return syntaxes.flatMap((syntax): MeasuredTrace[] => {
    const { upTo, caseName, path } = syntax;
    let good = true;
    const check = (sound: boolean) => { good = good && sound; };
    if (upTo) check(findName(upTo, elements, 'element', resolution.report));
    if (caseName) check(findName(caseName, caseNames, 'case', resolution.report));
    else if (cases.length > 1) {
      resolution.report(problemAt('case-required', `The load has several cases; say which one was measured: «for ${caseNames[0]}».`, syntax.span));
      check(false);
    }
    const codes = new Map<string, number>();
    for (const { tunable, code } of syntax.codes) {
      const found = findName(tunable, tunables.map((each) => each.name), 'tunable', resolution.report);
      check(found);
      const states = tunables.find((each) => each.name === tunable.value)?.states ?? [];
      if (found && !states.some((state) => state.code === code.value)) {
        resolution.report(problemAt('unknown-code', `«${tunable.value}» has no code ${code.value}.`, code.span));
        check(false);
      }
      if (codes.has(tunable.value)) resolution.report(problemAt('duplicate-code', `«${tunable.value}» has a code here already.`, tunable.span));
      else codes.set(tunable.value, code.value);
    }
    const { data } = resolveFile(path, resolution);
    if (data && data.ports !== 1) {
      resolution.report(problemAt('port', `What the analyser saw at the source end has one port; ${path.value} has ${data.ports}.`, path.span));
      check(false);
    }
    const fixture = (syntax.fixture ?? []).map((element) => resolveElement(element, 'fixture', resolution).element);
    if (!good) return [];
    const name = caseName?.value ?? cases[0]?.name ?? null;
    return [{ upTo: upTo?.value ?? null, data, caseName: name, codes, fixture }];
  });
}
