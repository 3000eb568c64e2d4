import { type Contour, extents, scaleContour } from '../../contour/contour.ts';
import { sampleToTolerance } from '../../contour/sampling.ts';
import { writeDat } from '../../formats/dat.ts';
import { DXF_DECIMALS } from '../../formats/dxf-tags.ts';
import { roundContour, withoutRepeats } from '../../formats/rounding.ts';
import { type CorePlan } from '../planner.ts';
import { type End } from '../plan.ts';
import { type CutFile } from './cut-file.ts';
import { type SheetIdentity } from './identity.ts';
import { downloadNameOf } from './names.ts';
import { coordinatesTitle } from './words.ts';

const DECIMALS = 6;
/** Rounding, here and in a drawing, may move a point by as much; it is taken off the tolerance beforehand. */
const ROUNDING_MM = Math.SQRT1_2 * (10 ** -DECIMALS + 10 ** -DXF_DECIMALS);

/** The whole section of an end at its chord within the plan's tolerance, in mm, its leading edge at the origin and its chord along x. */
export function sectionContour({ plan, core }: CorePlan, end: End): Contour {
  const { outline, chordMm } = core.panel[end];
  const contour = sampleToTolerance(outline, (plan.cut.toleranceMm - ROUNDING_MM) / chordMm);
  return withoutRepeats(roundContour(scaleContour(contour, chordMm), DECIMALS));
}

/** `root.dat` or `tip.dat`: the coordinates of a section version at its chord. */
export function sectionFile(core: CorePlan, identity: SheetIdentity, end: End, contour: Contour): CutFile {
  const { plan } = core;
  const title = coordinatesTitle(core, identity, end, plan.cut.toleranceMm);
  const box = extents(contour);
  const name = `${end}.dat`;
  return {
    name,
    downloadName: downloadNameOf(identity, plan.panel, name),
    part: 'sheet',
    mediaType: 'text/plain; charset=utf-8',
    text: writeDat(contour, title, { order: 'round', decimals: DECIMALS, newline: 'lf' }),
    facts: {
      kind: 'coordinates',
      points: contour.x.length,
      widthMm: box.maxX - box.minX,
      heightMm: box.maxY - box.minY,
    },
  };
}
