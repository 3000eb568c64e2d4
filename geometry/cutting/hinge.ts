import { type Point } from '../point.ts';
import { type Polyline, at, polylineOf } from './arrays.ts';
import { type CoreEnd } from './core.ts';
import { type Cutout, type Fault, verticalCut } from './feature-ends.ts';
import { type Surface } from './placing.ts';
import { alongWall } from './walls.ts';

/** Points of a flank that the simulation looks at. */
const ALONG_FLANK = 3;

/**
 * A V from the surface opposite to the hinge, up to a web that stays. The wire's centre runs half the kerf inside both flanks. Near the apex
 * the V is narrower than the round kerf: from there the wire goes up to the web and back by one slit, so that the web has the
 * thickness asked for and the flanks are plane as far as a round kerf can make them. A V that is narrower than the kerf all the way
 * is that slit alone.
 */
export function hingeAt(
  { core, path, halfKerfMm: h }: CoreEnd,
  hingeSurface: Surface,
  x: number,
  bevelDeg: number,
  webMm: number,
): Cutout | Fault {
  const [cut, way] = [verticalCut(core, x), verticalCut(path, x)];
  if (!cut || !way) return 'outside';
  const up = hingeSurface === 'upper';
  // Away from the hinge.
  const down = up ? -1 : 1;
  const apex = { x, y: up ? cut.high - webMm : cut.low + webMm };
  const depth = up ? apex.y - cut.low : cut.high - apex.y;
  if (depth <= 2 * h) return 'outside';
  const half = (bevelDeg * Math.PI) / 360;
  const mouthY = up ? way.low : way.high;
  const corner = { x, y: apex.y + down * h };
  // Where both lines half a kerf inside the flanks meet.
  const meet = { x, y: apex.y + (half > 0 ? (down * h) / Math.sin(half) : down * Infinity) };
  const [aft, fore] = ([1, -1] as const).map((side) => {
    const direction = { x: side * Math.sin(half), y: down * Math.cos(half) };
    return { edge: exitOf(core, apex, direction), mouth: exitOf(path, meet, direction), direction };
  });
  if (!aft?.edge || !fore?.edge) return 'outside';
  const slit = { x, y: mouthY };
  const [aftMouth, foreMouth] = [aft.mouth, fore.mouth];
  const open = down * (mouthY - meet.y) > 0 && aftMouth !== null && foreMouth !== null;
  const wire = open ? [aftMouth, meet, corner, meet, foreMouth] : [slit, slit, corner, slit, slit];
  const outline = [apex, fore.edge, aft.edge];
  // A flank ends where it leaves the round kerf of the slit.
  const flanks = [aft, fore].flatMap(({ edge, direction }) => {
    if (!open || !edge) return Array.from({ length: ALONG_FLANK }, () => null);
    const along = h / Math.tan(half);
    const foot = { x: apex.x + along * direction.x, y: apex.y + along * direction.y };
    return alongWall(edge, foot, ALONG_FLANK);
  });
  return {
    outline: polylineOf(up ? outline : outline.reverse()),
    wire,
    mouths: [
      {
        surface: up ? 'lower' : 'upper',
        edges: [
          { x: Math.max(x + h, aft.edge.x), y: aft.edge.y },
          { x: Math.min(x - h, fore.edge.x), y: fore.edge.y },
        ],
      },
    ],
    walls: [apex, ...flanks],
    webMm: Infinity,
  };
}

/** Where a ray from inside a closed outline leaves it; null when it starts at no finite place or never does. */
function exitOf({ x, y }: Polyline, from: Point, direction: Point): Point | null {
  if (!Number.isFinite(from.y)) return null;
  let nearest = Infinity;
  for (let i = 0, k = x.length - 1; i < x.length; k = i++) {
    const [ax, ay] = [at(x, k) - from.x, at(y, k) - from.y];
    const [bx, by] = [at(x, i) - from.x, at(y, i) - from.y];
    const [a, b] = [direction.x * ay - direction.y * ax, direction.x * by - direction.y * bx];
    if (a < 0 === b < 0) continue;
    const share = a / (a - b);
    const along = direction.x * (ax + share * (bx - ax)) + direction.y * (ay + share * (by - ay));
    if (along > 0 && along < nearest) nearest = along;
  }
  if (nearest === Infinity) return null;
  return { x: from.x + nearest * direction.x, y: from.y + nearest * direction.y };
}
