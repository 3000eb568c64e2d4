import { type Box } from '#client/drawing/sheet-layout.ts';
import { boxOf } from '#geometry/cutting/arrays.ts';
import { isometricExtent } from './isometric-view.tsx';
import { fittingScale, type Place, placeIn, type PlanLayout, type ViewId, type Zoom } from './plan-layout.ts';
import { planformExtent } from './planform-view.tsx';
import { facesAt, type Scene } from './scene.ts';

const LEAD = 14;

/** Where each view stands on the sheet. Both faces have one scale and one place along the chord, so that they lie under each other. */
export function viewPlaces(
  scene: Scene,
  layout: PlanLayout,
  zoom: Zoom,
  isometric: Box = layout.views.isometric,
): Readonly<Record<ViewId, Place>> {
  const { views, compact } = layout;
  const side = compact ? 14 : 22;
  const planformRoom = { left: compact ? 40 : 56, right: compact ? 40 : 56, top: 46, bottom: 30 };
  const faceRoom = { left: side, right: side, top: 24, bottom: 8 };
  const extent = faceExtent(scene);
  const scale = Math.min(
    fittingScale(views.root, extent, faceRoom),
    fittingScale(views.tip, extent, faceRoom),
  );
  const align = { scale, align: 'left' } as const;
  return {
    planform: placeIn(views.planform, planformExtent(scene), planformRoom, zoom),
    root: placeIn(views.root, extent, faceRoom, zoom, align),
    tip: placeIn(views.tip, extent, faceRoom, zoom, align),
    isometric: placeIn(isometric, isometricExtent(scene), { left: 12, right: 16, top: 26, bottom: 14 }, zoom),
  };
}

/** Both faces together, with room for the wire's way in and out. */
function faceExtent(scene: Scene) {
  const { block } = scene;
  const lines = [...facesAt(scene, 'root'), ...facesAt(scene, 'tip')].map(({ contour }) => contour);
  const { minX, maxX, minY, maxY } = boxOf(...lines);
  if (!block) return { minX, maxX, minY, maxY };
  return {
    minX: Math.min(minX, -LEAD),
    maxX: Math.max(maxX, block.lengthMm + LEAD),
    minY: Math.min(minY, 0),
    maxY: Math.max(maxY, block.heightMm),
  };
}
