import { memo, useMemo } from 'react';
import { type Units } from '#client/app/units.ts';
import { DASH, LINE } from '#client/drawing/line-types.ts';
import { type Box } from '#client/drawing/sheet-layout.ts';
import { boxOf } from '#geometry/cutting/arrays.ts';
import { type End } from '#geometry/cutting/plan.ts';
import { type Point } from '#geometry/point.ts';
import { linePath, wayPieces } from './line-paths.ts';
import { type Place } from './plan-layout.ts';
import { type PlanModel } from './plan-model.ts';
import { facesAt, type Scene, type SceneFace } from './scene.ts';
import { faceWords } from './view-words.ts';
import { ViewTitle } from './view-title.tsx';
import { pointAt, type WirePosition } from './wire-position.ts';

interface FaceViewProps {
  readonly model: PlanModel;
  readonly scene: Scene;
  readonly end: End;
  readonly box: Box;
  readonly place: Place;
  readonly units: Units;
}

/** One face of the panel in the block, seen with the leading edge at the left. */
export const FaceView = memo(function FaceView(props: FaceViewProps) {
  const { model, scene, end, box, place, units } = props;
  const faces = facesAt(scene, end);
  const { block } = scene;
  const { minX, maxY } = boxOf(...faces.map(({ contour }) => contour));
  const left = place.toX(Math.min(minX, block ? 0 : minX));
  const top = place.toY(Math.max(maxY, block?.heightMm ?? maxY));
  return (
    <g>
      <ViewTitle x={left} y={top - 8} text={faceWords(model, end, units)} room={box.width - 30} />
      {block && <BlockOutline {...block} place={place} />}
      {faces.map((face, i) => (
        <FaceLines
          key={i}
          face={face}
          place={place}
          hasSkin={hasSkin(model)}
          showsPath={!scene.wire && block !== null}
        />
      ))}
      {scene.wire && model.cut && (
        <path
          d={wayPieces(scene.wire[end], model.cut.kinds, place, (kind) => kind !== 'travel').join('')}
          className="fill-none stroke-wire opacity-70"
          strokeWidth={LINE.hair}
        />
      )}
    </g>
  );
});

function hasSkin({ plan }: PlanModel): boolean {
  return plan.allowances.upperMm + plan.allowances.lowerMm > 0;
}

function BlockOutline({
  lengthMm,
  heightMm,
  marginMm,
  place,
}: NonNullable<Scene['block']> & { place: Place }) {
  const { toX, toY } = place;
  const rectangle = (inset: number) => ({
    x: toX(inset),
    y: toY(heightMm - inset),
    width: Math.max(0, toX(lengthMm - inset) - toX(inset)),
    height: Math.max(0, toY(inset) - toY(heightMm - inset)),
  });
  const fits = 2 * marginMm < Math.min(lengthMm, heightMm);
  return (
    <>
      <rect
        {...rectangle(0)}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.narrow}
        strokeDasharray="7 3.5"
      />
      {marginMm > 0 && fits && (
        <rect
          {...rectangle(marginMm)}
          className="fill-none stroke-rule"
          strokeWidth={LINE.hair}
          strokeDasharray={DASH.short}
        />
      )}
    </>
  );
}

interface FaceLinesProps {
  readonly face: SceneFace;
  readonly place: Place;
  readonly hasSkin: boolean;
  readonly showsPath: boolean;
}

/** Foam, true contour round it, and what is cut out of the foam. */
function FaceLines({ face, place, hasSkin, showsPath }: FaceLinesProps) {
  const { nose, trailingEdge, features } = face;
  const { toX, toY } = place;
  return (
    <>
      <path
        d={linePath(face.core, place)}
        className="fill-foam stroke-ink"
        strokeWidth={hasSkin ? LINE.narrow : 0}
      />
      {features.map(({ index, outline }) => (
        <path
          key={index}
          d={linePath(outline, place)}
          className="fill-sheet stroke-ink"
          strokeWidth={LINE.narrow}
        />
      ))}
      <path
        d={`M${toX(nose.x)} ${toY(nose.y)}L${toX(trailingEdge.x)} ${toY(trailingEdge.y)}`}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.hair}
        strokeDasharray={DASH.longDashDot}
      />
      <path d={linePath(face.contour, place)} className="fill-none stroke-ink" strokeWidth={LINE.wide} />
      {showsPath && (
        <path d={linePath(face.path, place)} className="fill-none stroke-wire" strokeWidth={LINE.hair} />
      )}
      <FeatureNumbers face={face} place={place} />
    </>
  );
}

/** The numbers under which the list at the side and the findings know the features. */
function FeatureNumbers({ face, place }: { face: SceneFace; place: Place }) {
  const bottom = place.toY(boxOf(face.contour).minY) + 14;
  return (
    <g
      className="fill-graphite stroke-sheet"
      fontSize={10}
      textAnchor="middle"
      paintOrder="stroke"
      strokeWidth={4}
      strokeLinejoin="round"
    >
      {face.features.map(({ index, outline }) => {
        const { minX, maxX } = boxOf(outline);
        return (
          <text key={index} x={place.toX((minX + maxX) / 2)} y={bottom}>
            {index + 1}
          </text>
        );
      })}
    </g>
  );
}

interface FaceWireProps {
  readonly model: PlanModel;
  readonly scene: Scene;
  readonly end: End;
  readonly place: Place;
  readonly position: WirePosition;
}

/** The way that the wire has gone so far in the plane of a face, and where it is. */
export function FaceWire({ model, scene, end, place, position }: FaceWireProps) {
  const { wire } = scene;
  const { cut } = model;
  const pieces = useMemo(
    () => (wire && cut ? wayPieces(wire[end], cut.kinds, place, (kind) => kind !== 'travel') : []),
    [wire, cut, end, place],
  );
  if (!wire || !cut) return null;
  const now = pointAt(wire[end], position);
  const [x, y] = [place.toX(now.x), place.toY(now.y)];
  const last = position.kind === 'travel' ? '' : `L${x.toFixed(2)} ${y.toFixed(2)}`;
  return (
    <>
      <path
        d={pieces.slice(0, position.node).join('') + last}
        className="fill-none stroke-wire"
        strokeWidth={LINE.wide}
        strokeLinejoin="round"
      />
      {isNear(scene, now) && (
        <circle cx={x} cy={y} r={4.5} className="fill-wire stroke-sheet" strokeWidth={1.2} />
      )}
    </>
  );
}

/** Farther than this from the block the wire is not shown in the view of a face, mm. */
const REACH = 20;

function isNear({ block }: Scene, { x, y }: Point): boolean {
  if (!block) return false;
  return x > -REACH && x < block.lengthMm + REACH && y > -REACH && y < block.heightMm + REACH;
}
