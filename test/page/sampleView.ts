import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { assessDescription, type Assessment } from '../../src/assistance/assess';
import { panelView } from '../../src/assistance/panelView';
import { loadFiles } from '../../src/cli/loadFiles';
import { readDescription } from '../../src/description/readDescription';
import type { PanelView, ToPage } from '../../src/messages/panel';

const folder = fileURLToPath(new URL('../../media/samples/orchard/', import.meta.url));

/** The orchard sample as it is shown, or with its text changed. */
export function sampleAssessment(change: (text: string) => string = (text) => text): Assessment {
  const description = readDescription(change(readFileSync(`${folder}frost.match.yaml`, 'utf8')), { expressions: true });
  return assessDescription(description, loadFiles(description, [folder]));
}

export const sampleView = (change?: (text: string) => string): PanelView =>
  panelView(sampleAssessment(change), { fileName: 'frost.match.yaml', pinned: false, markerHz: null })!;

export const viewMessage = (view: PanelView, version = 1): ToPage => ({ type: 'view', document: 'file:///orchard/frost.match.yaml', version, view });
