import { shortLength, slugOf } from '../../formats/file-name.ts';
import { type PanelPlan } from '../plan.ts';
import { type SheetIdentity } from './identity.ts';

/**
 * The name that a file of a sheet is saved under, with sheet, version, part and chord: `outer-panel_v3_root_220mm.dxf` for `root.dxf`, and both
 * chords where a file is of both ends: `outer-panel_v3_core_220-160mm.nc`. Only a-z, 0-9, `.`, `_` and `-`.
 *
 * @param name the file's name within the sheet's version, for instance `ribs-1.dxf`
 */
export function downloadNameOf(
  { sheetName, versionNumber }: Pick<SheetIdentity, 'sheetName' | 'versionNumber'>,
  { root, tip }: PanelPlan,
  name: string,
): string {
  const [part = '', extension = ''] = name.split('.');
  const [rootChord, tipChord] = [shortLength(root.chordMm), shortLength(tip.chordMm)];
  const both = rootChord === tipChord ? rootChord : `${rootChord}-${tipChord}`;
  const chord = part === 'root' ? rootChord : part === 'tip' ? tipChord : both;
  return `${slugOf(sheetName) || 'sheet'}_v${versionNumber}_${part}_${chord}mm.${extension}`;
}
