import { type Units } from '#client/app/units.ts';
import { LinearDimension } from './linear-dimension.tsx';
import { type PlanModel } from './plan-model.ts';
import { type Scene } from './scene.ts';
import { dimensionText } from './view-words.ts';

type Corner = readonly [alongSpan: number, alongChord: number];
/** Corners of the panel from above: root nose, tip nose, tip rear, root rear. */
export type PlanformOutline = readonly [Corner, Corner, Corner, Corner];

interface PlanformDimensionsProps {
  readonly model: PlanModel;
  readonly scene: Scene;
  readonly outline: PlanformOutline;
  readonly toX: (alongSpan: number) => number;
  readonly toY: (alongChord: number) => number;
  readonly units: Units;
}

const LEVEL = 26;

/** Span, both depths, the tip's sweep where there is room for it, and how far the block stands from the left tower. */
export function PlanformDimensions(props: PlanformDimensionsProps) {
  const { model, scene, outline, toX, toY, units } = props;
  const { block } = scene;
  const [[, rootNose], [, tipNose], [, tipRear], [, rootRear]] = outline;
  const { spanMm } = scene;
  const point = (z: number, x: number) => ({ x: toX(z), y: toY(x) });
  const top = Math.min(toY(rootNose), toY(tipNose), block ? toY(0) : Infinity) - 13;
  const outwards = toX(0) < toX(spanMm) ? -1 : 1;
  const text = (mm: number) => dimensionText(Math.abs(mm), units);
  const sweep = tipNose - rootNose;
  return (
    <>
      <LinearDimension
        direction="level"
        from={point(0, rootNose)}
        to={point(spanMm, tipNose)}
        level={top}
        text={text(spanMm)}
      />
      <LinearDimension
        direction="upright"
        from={point(0, rootNose)}
        to={point(0, rootRear)}
        level={toX(0) + outwards * LEVEL}
        text={text(model.plan.panel.root.chordMm)}
      />
      <LinearDimension
        direction="upright"
        from={point(spanMm, tipNose)}
        to={point(spanMm, tipRear)}
        level={toX(spanMm) - outwards * LEVEL}
        text={text(model.plan.panel.tip.chordMm)}
      />
      {Math.abs(toY(tipNose) - toY(rootNose)) > 12 && (
        <LinearDimension
          direction="upright"
          from={point(0, rootNose)}
          to={point(spanMm, tipNose)}
          level={toX(spanMm) - outwards * 2 * LEVEL}
          text={text(sweep)}
        />
      )}
      <TowerDimension {...props} />
    </>
  );
}

/** The distance at which the block is set up: from the left tower to the panel's face next to it. */
function TowerDimension({ scene, outline, toX, toY, units }: PlanformDimensionsProps) {
  const { bench, block, spanMm } = scene;
  if (!bench || !block) return null;
  const face = Math.abs(bench.leftAt) < Math.abs(bench.leftAt - spanMm) ? 0 : spanMm;
  const start = Math.max(toY(block.lengthMm), ...outline.map(([, x]) => toY(x)));
  return (
    <LinearDimension
      direction="level"
      from={{ x: toX(bench.leftAt), y: start }}
      to={{ x: toX(face), y: start }}
      level={start + 9}
      textSide={toX(bench.leftAt) > toX(face) ? 'before' : 'after'}
      text={dimensionText(Math.abs(face - bench.leftAt), units)}
    />
  );
}
