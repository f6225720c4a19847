import type { Diagnostic, Report } from '../base/diagnostic';
import type { Located } from '../base/span';
import type { Element } from '../network/element';
import type { Problem } from '../study/problem';
import type { LadderTask, Unknown } from '../study/unknown';
import type { Description, Model } from './description';
import type { FileReference, LoadedFiles } from './files';
import { orderedDiagnostics } from './orderedDiagnostics';
import { reportTwice } from './resolve/findName';
import { noFigures } from './resolve/makePart';
import { doubtAt, type Resolution } from './resolve/resolution';
import { middleOf, resolveBands, resolveSweep } from './resolve/resolveBands';
import { resolveCases } from './resolve/resolveCases';
import { resolveChannels } from './resolve/resolveChannels';
import { resolveElement, type ResolvedElement } from './resolve/resolveElement';
import { resolveFamilies } from './resolve/resolveFamilies';
import { resolveGoals } from './resolve/resolveGoals';
import { resolveMeasured } from './resolve/resolveMeasured';
import { resolveSource } from './resolve/resolveSource';
import { connectTunables, resolveTunables } from './resolve/resolveTunables';
import { partChoices } from './resolve/unknownChoices';
import type { DescriptionSyntax } from './syntax';

export interface BuildOptions {
  /** «Solve again»: every value with `from FAMILY` that is not marked `fixed` becomes an unknown too, with `reopened`. */
  readonly reopen?: boolean;
}

const noLadder: Element = { form: 'faulty', name: 'ladder', orientation: 'through', reason: 'it could not be read' };
const defaultZ0Ohm = 50;
const defaultPowerW = 1e-3;
const defaultBuilds = 10_000;
const defaultSeed = 1;
const defaultSymbol = 'antenna_codes';

/**
 * Turns a description and its files into something that can be studied. Never throws: what names, files or numbers make
 * impossible is reported at its place, and the rest is there. A file that is not in the map counts as not read yet.
 */
export function buildModel(description: Description, files: LoadedFiles, options: BuildOptions = {}): Model {
  const { syntax } = description;
  const diagnostics: Diagnostic[] = [...description.diagnostics];
  const missing: FileReference[] = [];
  const report: Report = (diagnostic) => void diagnostics.push(diagnostic);
  const problem = resolveProblem(syntax, { files, report, missing }, options);
  return { problem, diagnostics: orderedDiagnostics(diagnostics), missingFiles: distinct(missing) };
}

function resolveProblem(syntax: DescriptionSyntax, base: Pick<Resolution, 'files' | 'report' | 'missing'>, options: BuildOptions): Problem | null {
  const z0Ohm = syntax.z0Ohm?.value ?? defaultZ0Ohm;
  const bands = resolveBands(syntax, base);
  const hasBands = bands.length > 0;
  const numbers = { ...base, z0Ohm, middleHz: hasBands ? middleOf(bands[0]) : 1e9, hasBands };
  const untuned: Resolution = { ...numbers, families: resolveFamilies(syntax.families, numbers), tunables: new Map() };
  const resolution: Resolution = { ...untuned, tunables: resolveTunables(syntax.tunables, untuned) };
  checkElementNames(syntax, base.report);
  const cases = resolveCases(syntax, resolution);
  const resolved = (syntax.ladder?.elements ?? []).map((element) => resolveElement(element, 'ladder', resolution));
  // Without a ladder that can be read nothing beyond the load is known; an empty one would be a direct connection.
  const ladder = syntax.ladder ? resolved.map((each) => each.element) : [noLadder];
  const ladderTask = resolveLadderTask(syntax, resolution);
  const elements = ladder.map((element) => element.name);
  const tunables = connectTunables(syntax, ladder, resolution);
  const source = resolveSource(syntax, bands, resolution);
  const faultyBands = syntax.bands.map((band) => band.name.value).filter((name) => !bands.some((band) => band.name === name));
  const goals = resolveGoals(syntax, { bands, faultyBands, cases, elements: syntax.ladder?.solve ? null : elements }, resolution);
  const channelsHz = resolveChannels(syntax, bands, tunables.length, resolution);
  const measured = resolveMeasured(syntax.measured, { cases, elements, tunables }, resolution);
  if (syntax.firmware && syntax.tunables.length === 0) {
    base.report(doubtAt('firmware-without-tunables', 'A firmware table needs tunable parts; there are none.', syntax.firmware.span));
  }
  if (!hasBands || cases.length === 0) return null;
  return {
    title: syntax.title?.value ?? null,
    z0Ohm, source, availablePowerW: syntax.powerW?.value ?? defaultPowerW,
    bands, sweepHz: resolveSweep(syntax, bands), cases, ladder, goals,
    unknowns: unknownsOf(resolved, options), ladderTask,
    families: [...resolution.families.values()].filter((each) => each.usable).map((each) => each.family),
    tunables, channelsHz,
    firmware: syntax.firmware && {
      header: syntax.firmware.header?.value ?? null, json: syntax.firmware.json?.value ?? null, symbol: syntax.firmware.symbol?.value ?? defaultSymbol,
    },
    spread: { distribution: syntax.spread?.value ?? 'uniform', builds: syntax.builds?.value ?? defaultBuilds, seed: syntax.seed?.value ?? defaultSeed },
    measured,
  };
}

function unknownsOf(resolved: readonly ResolvedElement[], options: BuildOptions): Unknown[] {
  return resolved.flatMap(({ element, choices, mayOmit, known }, elementIndex): Unknown[] => {
    if (!choices || (known && !options.reopen)) return [];
    return [{ elementIndex, name: element.name, choices, mayOmit, reopened: known }];
  });
}

/** Element names are unique in the ladder and each fixture that goes with it. */
function checkElementNames(syntax: DescriptionSyntax, report: Report): void {
  const shared = [...syntax.fixture, ...(syntax.ladder?.elements ?? [])].map((element) => element.name);
  const own = [...(syntax.load?.cases ?? []).map((each) => each.fixture ?? []), ...syntax.measured.map((each) => each.fixture ?? [])];
  reportTwice(inOrder(shared), 'element', report);
  for (const fixture of own.filter((each) => each.length > 0)) {
    const ladder = (syntax.ladder?.elements ?? []).map((element) => element.name.value);
    reportTwice(fixture.map((element) => element.name), 'element', report);
    for (const { name } of fixture.filter((element) => ladder.includes(element.name.value))) {
      report({ code: 'duplicate-name', severity: 'error', message: `The element «${name.value}» stands in the ladder too; each needs a name of its own.`, span: name.span });
    }
  }
}

const inOrder = (names: readonly Located<string>[]) => [...names].sort((a, b) => a.span.start - b.span.start);

function resolveLadderTask(syntax: DescriptionSyntax, resolution: Resolution): LadderTask | null {
  const solve = syntax.ladder?.solve;
  if (!solve) return null;
  const choices = partChoices({ range: null, series: solve.series, families: solve.families, span: solve.span }, null, noFigures, resolution);
  if (solve.form === 'up to') return { form: 'up to', elements: solve.elements ?? 2, choices };
  return { form: solve.form, q: solve.q?.value ?? null, bandwidthHz: solve.bandwidthHz?.value ?? null, choices };
}

function distinct(missing: readonly FileReference[]): FileReference[] {
  return [...new Map(missing.map((reference) => [reference.path, reference])).values()];
}
