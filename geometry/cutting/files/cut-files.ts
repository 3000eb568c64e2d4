import { type DxfRelease, writeDxfDocument } from '../../formats/dxf.ts';
import { CHECKSUM_DIGITS } from '../../formats/identity.ts';
import { boxOf } from '../arrays.ts';
import { type CorePlan, type Cut } from '../planner.ts';
import { ENDS, type End } from '../plan.ts';
import { comment, commentText } from '../program-text.ts';
import { type CutFile } from './cut-file.ts';
import { endDrawing } from './end-drawing.ts';
import { type SheetIdentity } from './identity.ts';
import { pairsInStep } from './in-step.ts';
import { downloadNameOf } from './names.ts';
import { ribSheets } from './rib-drawing.ts';
import { sectionContour, sectionFile } from './section-file.ts';

/** How the files are written. */
interface CutFileOptions {
  /** Release of the DXF files; `r12` for old controllers. */
  readonly release?: DxfRelease;
}

/**
 * All text files of a cut sheet: `root.dxf` and `tip.dxf` where there is a foam core, `core.nc` where a machine cuts it, `ribs-1.dxf` and so on for each
 * sheet of ribs, and `root.dat` and `tip.dat`. The same plan and identity give the same bytes. Names are free text: each stays on its line, escaped as its
 * format wants it.
 *
 * @throws RangeError when the plan was worked out for another sheet or version than the identity names
 */
export function cutFiles(
  core: CorePlan,
  identity: SheetIdentity,
  { release = 'r2000' }: CutFileOptions = {},
): readonly CutFile[] {
  const contours = { root: sectionContour(core, 'root'), tip: sectionContour(core, 'tip') };
  const endFile = (end: End): CutFile => {
    const outline = core.core[end].core;
    const box = boxOf(outline);
    const text = writeDxfDocument(endDrawing(core, identity, end, contours[end]), release);
    return {
      ...named(core, identity, `${end}.dxf`),
      part: 'core',
      mediaType: DXF,
      text,
      facts: {
        kind: 'outline',
        pairs: pairsInStep(core.core).length,
        widthMm: box.maxX - box.minX,
        heightMm: box.maxY - box.minY,
      },
    };
  };
  return [
    ...(core.plan.block ? ENDS.map(endFile) : []),
    ...(core.cut ? [programFile(core, identity, core.cut)] : []),
    ...ribFiles(core, identity, release),
    ...ENDS.map((end) => sectionFile(core, identity, end, contours[end])),
  ];
}

const DXF = 'image/vnd.dxf';

function named({ plan }: CorePlan, identity: SheetIdentity, name: string) {
  return { name, downloadName: downloadNameOf(identity, plan.panel, name) };
}

function programFile(core: CorePlan, identity: SheetIdentity, { program }: Cut): CutFile {
  const { text, totalSeconds } = program;
  const said = [
    comment('Sheet', `${commentText(identity.sheetName)} v${identity.versionNumber}`),
    comment('Checksum', identity.checksum.slice(0, CHECKSUM_DIGITS)),
  ];
  const lines = text.split('\n').slice(0, -1);
  if (!said.every((line) => lines.includes(line)))
    throw new RangeError(`The program does not say ${said.join(' and ')}: it is of another version.`);
  return {
    ...named(core, identity, 'core.nc'),
    part: 'core',
    mediaType: 'text/plain; charset=utf-8',
    text,
    facts: { kind: 'program', lines: lines.length, seconds: totalSeconds },
  };
}

function ribFiles(core: CorePlan, identity: SheetIdentity, release: DxfRelease): CutFile[] {
  return ribSheets(core, identity).map(({ document, numbers }, index): CutFile => ({
    ...named(core, identity, `ribs-${index + 1}.dxf`),
    part: 'ribs',
    mediaType: DXF,
    text: writeDxfDocument(document, release),
    facts: { kind: 'ribs', numbers, widthMm: document.extents.maxX, heightMm: document.extents.maxY },
  }));
}
