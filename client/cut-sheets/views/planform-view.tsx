import { memo } from 'react';
import { type Units } from '#client/app/units.ts';
import { DASH, LINE } from '#client/drawing/line-types.ts';
import { type Box } from '#client/drawing/sheet-layout.ts';
import { boxOf } from '#geometry/cutting/arrays.ts';
import { type Place } from './plan-layout.ts';
import { type PlanModel } from './plan-model.ts';
import { PlanformDimensions, type PlanformOutline } from './planform-dimensions.tsx';
import { type Scene, type SceneCore, shownAt } from './scene.ts';
import { ViewTitle } from './view-title.tsx';
import { pointAt, type WirePosition } from './wire-position.ts';

/** The extent of the planform: the span across the page (root at −, the sign is the scene's), the chord down it. */
export function planformExtent(scene: Scene) {
  const { block, bench, cores } = scene;
  const first = cores[0];
  const boxes = first ? [boxOf(first.root.contour, first.tip.contour)] : [];
  const across = [
    0,
    scene.spanMm,
    ...(block ? [block.from, block.to] : []),
    ...(bench ? [bench.leftAt, bench.rightAt] : []),
  ];
  const down = [...boxes.flatMap(({ minX, maxX }) => [minX, maxX]), ...(block ? [0, block.lengthMm] : [])];
  const pages = across.map((at) => pageAt(scene, at));
  return {
    minX: Math.min(...pages),
    maxX: Math.max(...pages),
    minY: -Math.max(...down),
    maxY: -Math.min(...down),
  };
}

/** A distance from the root face along the span as a place across the page. */
export function pageAt(scene: Pick<Scene, 'rootAtLeft' | 'stretches'>, alongSpan: number): number {
  const shown = shownAt(scene, alongSpan);
  return scene.rootAtLeft ? shown : -shown;
}

interface PlanformViewProps {
  readonly model: PlanModel;
  readonly scene: Scene;
  readonly box: Box;
  readonly place: Place;
  readonly units: Units;
}

/** The panel from above, leading edge at the top, in its block between the towers. */
export const PlanformView = memo(function PlanformView({
  model,
  scene,
  box,
  place,
  units,
}: PlanformViewProps) {
  const { block, bench, cores } = scene;
  const core = cores[0];
  if (!core) return null;
  const toX = (alongSpan: number) => place.toX(pageAt(scene, alongSpan));
  const toY = (chordwise: number) => place.toY(-chordwise);
  const outline = outlineOf(core, scene.spanMm);
  const path = (points: readonly (readonly [number, number])[]) =>
    points.map(([z, x], i) => `${i === 0 ? 'M' : 'L'}${toX(z).toFixed(2)} ${toY(x).toFixed(2)}`).join('');
  return (
    <g>
      <ViewTitle
        x={place.corner.x + 14}
        y={place.corner.y + 20}
        text="Planform, seen from above"
        room={box.width - 28}
      />
      {block && <BlockRectangle block={block} path={path} />}
      <path
        d={`${path(outline)}Z`}
        className="fill-foam stroke-ink"
        strokeWidth={LINE.wide}
        strokeLinejoin="round"
      />
      <WashoutAxis model={model} path={path} core={core} spanMm={scene.spanMm} />
      {model.ribs?.stationsMm.map((station) => (
        <RibLine
          key={station}
          outline={outline}
          at={station / scene.spanMm}
          path={path}
          spanMm={scene.spanMm}
        />
      ))}
      {model.features.map((feature, i) => (
        <FeatureBand key={feature.index} core={core} at={i} path={path} spanMm={scene.spanMm} />
      ))}
      <Breaks scene={scene} toX={toX} place={place} />
      {bench && <Towers bench={bench} toX={toX} box={box} top={place} scene={scene} />}
      <PlanformDimensions {...{ model, scene, outline, toX, toY, units }} />
    </g>
  );
});

function BlockRectangle({ block, path }: { block: NonNullable<Scene['block']>; path: PathOf }) {
  const { from, to, lengthMm } = block;
  return (
    <path
      d={`${path([
        [from, 0],
        [to, 0],
        [to, lengthMm],
        [from, lengthMm],
      ])}Z`}
      className="fill-none stroke-graphite"
      strokeWidth={LINE.narrow}
      strokeDasharray="7 3.5"
    />
  );
}

type PathOf = (points: readonly (readonly [number, number])[]) => string;
function outlineOf(core: SceneCore, spanMm: number): PlanformOutline {
  const [root, tip] = [boxOf(core.root.contour), boxOf(core.tip.contour)];
  return [
    [0, root.minX],
    [spanMm, tip.minX],
    [spanMm, tip.maxX],
    [0, root.maxX],
  ];
}

function WashoutAxis({
  model,
  path,
  core,
  spanMm,
}: {
  model: PlanModel;
  path: PathOf;
  core: SceneCore;
  spanMm: number;
}) {
  const station = model.plan.panel.washoutStation;
  const at = (end: 'root' | 'tip') =>
    core[end].nose.x + station * (core[end].trailingEdge.x - core[end].nose.x);
  return (
    <path
      d={path([
        [-0.02 * spanMm, at('root') - 0.02 * (at('tip') - at('root'))],
        [1.02 * spanMm, at('tip') + 0.02 * (at('tip') - at('root'))],
      ])}
      className="fill-none stroke-graphite"
      strokeWidth={LINE.narrow}
      strokeDasharray={DASH.longDashDot}
    />
  );
}

function RibLine({
  outline,
  at,
  path,
  spanMm,
}: {
  outline: PlanformOutline;
  at: number;
  path: PathOf;
  spanMm: number;
}) {
  const [[, rootNose], [, tipNose], [, tipRear], [, rootRear]] = outline;
  return (
    <path
      d={path([
        [at * spanMm, rootNose + at * (tipNose - rootNose)],
        [at * spanMm, rootRear + at * (tipRear - rootRear)],
      ])}
      className="fill-none stroke-ink"
      strokeWidth={LINE.hair}
    />
  );
}

/** Features lie inside or in the surface that one looks on: their edges are hidden, so dashed. */
function FeatureBand({
  core,
  at,
  path,
  spanMm,
}: {
  core: SceneCore;
  at: number;
  path: PathOf;
  spanMm: number;
}) {
  const [root, tip] = [core.root.features[at], core.tip.features[at]];
  if (!root || !tip) return null;
  const [a, b] = [boxOf(root.outline), boxOf(tip.outline)];
  return (
    <path
      d={
        path([
          [0, a.minX],
          [spanMm, b.minX],
        ]) +
        path([
          [0, a.maxX],
          [spanMm, b.maxX],
        ])
      }
      className="fill-none stroke-ink"
      strokeWidth={LINE.narrow}
      strokeDasharray="5 2.5"
    />
  );
}

/** Lines with a zigzag where the view is interrupted. */
function Breaks({ scene, toX, place }: { scene: Scene; toX: (alongSpan: number) => number; place: Place }) {
  const { minY, maxY } = planformExtent(scene);
  const [top, bottom] = [place.toY(maxY) - 4, place.toY(minY) + 4];
  const middle = (top + bottom) / 2;
  const inner = scene.stretches.find(({ shift }) => shift === 0);
  const edges = scene.stretches.flatMap(({ from, to, shift }) => {
    if (shift === 0 || !inner) return [];
    return from < inner.from ? [to, inner.from] : [inner.to, from];
  });
  return edges.map((edge) => {
    const x = toX(edge);
    return (
      <path
        key={edge}
        d={`M${x} ${top}V${middle - 6}L${x + 4} ${middle - 3}L${x - 4} ${middle + 3}L${x} ${middle + 6}V${bottom}`}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.hair}
      />
    );
  });
}

interface TowersProps {
  readonly bench: NonNullable<Scene['bench']>;
  readonly scene: Scene;
  readonly toX: (alongSpan: number) => number;
  readonly top: Place;
  readonly box: Box;
}

function Towers({ bench, scene, toX, top, box }: TowersProps) {
  const { minY, maxY } = planformExtent(scene);
  const [y1, y2] = [top.toY(maxY) - 12, top.toY(minY) + 12];
  return (
    <g>
      {(
        [
          ['left tower', bench.leftAt],
          ['right tower', bench.rightAt],
        ] as const
      ).map(([name, at]) => {
        const x = toX(at);
        const atLeft = x < box.x + box.width / 2;
        return (
          <g key={name}>
            <path d={`M${x} ${y1}V${y2}`} className="fill-none stroke-graphite" strokeWidth={LINE.wide} />
            <text
              x={atLeft ? x - 4 : x + 4}
              y={y2 + 12}
              fontSize={11}
              textAnchor={atLeft ? 'start' : 'end'}
              className="fill-graphite"
            >
              {name}
            </text>
          </g>
        );
      })}
    </g>
  );
}

interface PlanformWireProps {
  readonly scene: Scene;
  readonly place: Place;
  readonly position: WirePosition;
}

/** The wire from tower to tower, as it lies at a moment. */
export function PlanformWire({ scene, place, position }: PlanformWireProps) {
  const { wire, bench, spanMm, stretches } = scene;
  if (!wire || !bench) return null;
  const [root, tip] = [pointAt(wire.root, position).x, pointAt(wire.tip, position).x];
  const pixel = (at: number) => ({
    x: place.toX(pageAt(scene, at)),
    y: place.toY(-(root + (at / spanMm) * (tip - root))),
  });
  return (
    <>
      {stretches.map(({ from, to }) => {
        const [a, b] = [pixel(from), pixel(to)];
        return (
          <path
            key={from}
            d={`M${a.x} ${a.y}L${b.x} ${b.y}`}
            className="fill-none stroke-wire"
            strokeWidth={LINE.wide}
          />
        );
      })}
      {[bench.leftAt, bench.rightAt].map((at) => {
        const { x, y } = pixel(at);
        return <circle key={at} cx={x} cy={y} r={3} className="fill-wire" />;
      })}
    </>
  );
}
