import { memo } from 'react';
import { DASH, LINE } from '#client/drawing/line-types.ts';
import { type Box } from '#client/drawing/sheet-layout.ts';
import { type Point } from '#geometry/point.ts';
import { hullOf, pointsOf, pointsPath } from './line-paths.ts';
import { type Place } from './plan-layout.ts';
import { type Scene, type SceneCore, type SceneFace, shownAt } from './scene.ts';
import { ViewTitle } from './view-title.tsx';
import { pointAt, type WirePosition } from './wire-position.ts';

const COS30 = Math.sqrt(3) / 2;

/**
 * A point of the block's frame in the isometric view (ISO 5456-3): all three axes shortened alike, seen from above before the leading edge
 * at the root. x aft, y up, then from the root along the span, mm.
 */
export function project(
  scene: Pick<Scene, 'rootAtLeft' | 'stretches'>,
  x: number,
  y: number,
  alongSpan: number,
): Point {
  const z = shownAt(scene, alongSpan);
  const across = (z - x) * COS30;
  // The mirrored panel is seen as its mirror image.
  return { x: scene.rootAtLeft ? -across : across, y: y + (x + z) / 2 };
}

/** Corners of the block, or of the panel where there is none, and the towers' rails. */
export function isometricExtent(scene: Scene) {
  const corners = cornersOf(scene).flat();
  const towers = scene.bench
    ? [scene.bench.leftAt, scene.bench.rightAt].flatMap((at) =>
        [0, scene.block?.lengthMm ?? 0].map((x) => project(scene, x, 0, at)),
      )
    : [];
  const bodies = scene.cores.flatMap((core) =>
    ends(scene, core).flatMap(({ face, at }) => ringOf(scene, face, at)),
  );
  const points = [...corners, ...bodies, ...towers];
  const [xs, ys] = [points.map(({ x }) => x), points.map(({ y }) => y)];
  return { minX: Math.min(...xs), maxX: Math.max(...xs), minY: Math.min(...ys), maxY: Math.max(...ys) };
}

/** Underside and top of the block as four corners each, from the front at the root round. */
function cornersOf(scene: Scene): readonly [readonly Point[], readonly Point[]] {
  const { block, spanMm, cores } = scene;
  const reach = cores.flatMap(({ root, tip }) => [
    root.nose.x,
    root.trailingEdge.x,
    tip.nose.x,
    tip.trailingEdge.x,
  ]);
  const [x0, x1] = block ? [0, block.lengthMm] : [Math.min(...reach), Math.max(...reach)];
  const [z0, z1] = block ? [block.from, block.to] : [0, spanMm];
  const level = (y: number) => [
    project(scene, x0, y, z0),
    project(scene, x1, y, z0),
    project(scene, x1, y, z1),
    project(scene, x0, y, z1),
  ];
  return [level(0), level(block?.heightMm ?? 0)];
}

interface IsometricViewProps {
  readonly scene: Scene;
  readonly box: Box;
  readonly place: Place;
}

/** Block, core and towers. */
export const IsometricView = memo(function IsometricView({ scene, box, place }: IsometricViewProps) {
  return (
    <g>
      <ViewTitle
        x={place.corner.x + 10}
        y={place.corner.y + 16}
        text="Isometric view"
        room={box.width - 20}
      />
      {scene.block && <BlockEdges scene={scene} place={place} />}
      {scene.cores.map((core) => (
        <CoreBody key={String(core.mirrored)} scene={scene} core={core} place={place} />
      ))}
      {scene.bench && <TowerRails scene={scene} place={place} />}
    </g>
  );
});

/** The three edges that meet in the hidden corner (rear, underside, tip) are dashed. */
function BlockEdges({ scene, place }: { scene: Scene; place: Place }) {
  const [low, high] = cornersOf(scene);
  const [a, b, c, d] = low;
  const [e, f, g, h] = high;
  if (!a || !b || !c || !d || !e || !f || !g || !h) return null;
  const hidden = [b, d, g].map((end) => pointsPath([c, end], place)).join('');
  const seen =
    pointsPath([e, f, g, h], place, true) + pointsPath([f, b, a, d, h], place) + pointsPath([a, e], place);
  return (
    <>
      <path
        d={hidden}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.hair}
        strokeDasharray={DASH.short}
      />
      <path d={seen} className="fill-none stroke-graphite" strokeWidth={LINE.narrow} strokeLinejoin="round" />
    </>
  );
}

/** The faces of a core in the planes of root and tip. */
function ends({ spanMm }: Scene, { mirrored, root, tip }: SceneCore) {
  const [first, last] = mirrored ? [tip, root] : [root, tip];
  return [
    { face: first, at: 0 },
    { face: last, at: spanMm },
  ] as const;
}

function ringOf(scene: Scene, face: SceneFace, alongSpan: number): Point[] {
  return pointsOf(face.contour).map(({ x, y }) => project(scene, x, y, alongSpan));
}

function CoreBody({ scene, core, place }: { scene: Scene; core: SceneCore; place: Place }) {
  const [{ face: atRoot }, { face: atTip }] = ends(scene, core);
  const [near, far] = [ringOf(scene, atRoot, 0), ringOf(scene, atTip, scene.spanMm)];
  return (
    <>
      <path
        d={pointsPath(hullOf([...near, ...far]), place, true)}
        className="fill-foam stroke-ink"
        strokeWidth={LINE.narrow}
        strokeLinejoin="round"
      />
      {core.root.features.map(({ index }, i) => (
        <FeatureLine
          key={index}
          scene={scene}
          near={atRoot.features[i]}
          far={atTip.features[i]}
          place={place}
        />
      ))}
      <path
        d={pointsPath(near, place, true)}
        className="fill-foam stroke-ink"
        strokeWidth={LINE.wide}
        strokeLinejoin="round"
      />
      {atRoot.features.map(({ index, outline }) => (
        <path
          key={index}
          d={pointsPath(
            pointsOf(outline).map(({ x, y }) => project(scene, x, y, 0)),
            place,
            true,
          )}
          className="fill-sheet stroke-ink"
          strokeWidth={LINE.hair}
        />
      ))}
    </>
  );
}

type FeatureEnd = SceneCore['root']['features'][number];

function FeatureLine(props: {
  scene: Scene;
  near: FeatureEnd | undefined;
  far: FeatureEnd | undefined;
  place: Place;
}) {
  const { scene, near, far, place } = props;
  if (!near || !far) return null;
  const middle = ({ outline: { x, y } }: FeatureEnd, z: number) => {
    const mean = (of: Float64Array) => of.reduce((sum, value) => sum + value, 0) / of.length;
    return project(scene, mean(x), mean(y), z);
  };
  return (
    <path
      d={pointsPath([middle(near, 0), middle(far, scene.spanMm)], place)}
      className="fill-none stroke-ink"
      strokeWidth={LINE.hair}
      strokeDasharray={DASH.longDashDot}
    />
  );
}

/** The rails along the bench on which the towers run. */
function TowerRails({ scene, place }: { scene: Scene; place: Place }) {
  const { bench, block } = scene;
  if (!bench) return null;
  return [bench.leftAt, bench.rightAt].map((at) => (
    <path
      key={at}
      d={pointsPath([project(scene, 0, 0, at), project(scene, block?.lengthMm ?? 0, 0, at)], place)}
      className="fill-none stroke-graphite"
      strokeWidth={LINE.wide}
    />
  ));
}

interface IsometricWireProps {
  readonly scene: Scene;
  readonly place: Place;
  readonly position: WirePosition;
}

/** The wire from tower to tower. */
export function IsometricWire({ scene, place, position }: IsometricWireProps) {
  const { wire, bench } = scene;
  if (!wire || !bench) return null;
  const tower = (line: typeof wire.leftTower, at: number) => {
    const { x, y } = pointAt(line, position);
    return { carriage: project(scene, x, y, at), foot: project(scene, x, 0, at) };
  };
  const [root, tip] = [pointAt(wire.root, position), pointAt(wire.tip, position)];
  const along = (at: number) => {
    const share = at / scene.spanMm;
    return project(scene, root.x + share * (tip.x - root.x), root.y + share * (tip.y - root.y), at);
  };
  const [left, right] = [tower(wire.leftTower, bench.leftAt), tower(wire.rightTower, bench.rightAt)];
  return (
    <>
      <path
        d={[left, right].map(({ foot, carriage }) => pointsPath([foot, carriage], place)).join('')}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.wide}
      />
      {scene.stretches.map(({ from, to }) => (
        <path
          key={from}
          d={pointsPath([from, to].map(along), place)}
          className="fill-none stroke-wire"
          strokeWidth={LINE.wide}
        />
      ))}
    </>
  );
}
