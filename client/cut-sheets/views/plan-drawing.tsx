import { memo, type ReactNode, type RefObject, useId, useMemo } from 'react';
import { type Units } from '#client/app/units.ts';
import { SheetFrame } from '#client/drawing/sheet-frame.tsx';
import { SheetRemarks } from '#client/drawing/sheet-remarks.tsx';
import { ENDS } from '#geometry/cutting/plan.ts';
import { FaceView, FaceWire } from './face-view.tsx';
import { IsometricView, IsometricWire } from './isometric-view.tsx';
import { type PlanLayout, sideBoxes, type SideViews, UNZOOMED, type Zoom } from './plan-layout.ts';
import { type PlanModel } from './plan-model.ts';
import { PlanTitleBlock, type PlanIdentity } from './plan-title-block.tsx';
import { PlanformView, PlanformWire } from './planform-view.tsx';
import { RibsView } from './ribs-view.tsx';
import { type Scene, sceneOf } from './scene.ts';
import { viewPlaces } from './view-places.ts';
import { viewScale } from './view-words.ts';
import { type WirePosition } from './wire-position.ts';

export interface PlanDrawingProps {
  readonly model: PlanModel;
  readonly layout: PlanLayout;
  readonly identity: PlanIdentity;
  readonly units: Units;
  readonly zoom?: Zoom | undefined;
  /** Where the wire is; null draws none. */
  readonly position?: WirePosition | null | undefined;
  readonly remarks?: readonly string[] | undefined;
  /** The drawing belongs to other values than those of the form. */
  readonly dimmed?: boolean | undefined;
  /** What lies over the views: marks of a finding. */
  readonly over?: ((scene: Scene, places: ReturnType<typeof viewPlaces>) => ReactNode) | undefined;
  readonly element?: RefObject<SVGSVGElement | null> | undefined;
}

/** The sheet of a plan: planform, both faces in the block, isometric view, frame and title block. */
export const PlanDrawing = memo(function PlanDrawing(props: PlanDrawingProps) {
  const { model, layout, identity, units, zoom = UNZOOMED, position, remarks, dimmed, over, element } = props;
  const scene = useMemo(() => sceneOf(model), [model]);
  const side = useMemo(() => sideBoxes(layout, sideOf(model)), [layout, model]);
  const places = useMemo(
    () => viewPlaces(scene, layout, zoom, side.isometric ?? undefined),
    [scene, layout, zoom, side],
  );
  const clip = useId();
  const scale = viewScale(places.root.scale * layout.scale);
  return (
    <svg
      ref={element}
      viewBox={`0 0 ${layout.width} ${layout.height}`}
      width={layout.width * layout.scale}
      height={layout.height * layout.scale}
      role="img"
      aria-label={`Cut sheet ${identity.title}: planform, root and tip face in the block, isometric view`}
      className="block h-auto max-w-full touch-pan-y select-none data-panning:cursor-grabbing"
    >
      <SheetFrame layout={layout} />
      <clipPath id={clip}>
        <rect {...layout.drawing} />
      </clipPath>
      <g clipPath={`url(#${clip})`} className={dimmed === true ? 'opacity-40' : undefined}>
        <Views {...{ model, scene, layout, places, side, zoom, units }} />
        {position && (
          <g aria-hidden="true">
            <PlanformWire scene={scene} place={places.planform} position={position} />
            {ENDS.map((end) => (
              <FaceWire key={end} {...{ model, scene, end, position }} place={places[end]} />
            ))}
            {side.isometric && <IsometricWire scene={scene} place={places.isometric} position={position} />}
          </g>
        )}
        {over?.(scene, places)}
      </g>
      <SheetRemarks layout={layout} remarks={[...remarksOf(units, model), ...(remarks ?? [])]} />
      <PlanTitleBlock layout={layout} identity={identity} plan={model.plan} scale={scale} units={units} />
    </svg>
  );
});

interface ViewsProps {
  readonly model: PlanModel;
  readonly scene: Scene;
  readonly layout: PlanLayout;
  readonly places: ReturnType<typeof viewPlaces>;
  readonly side: ReturnType<typeof sideBoxes>;
  readonly zoom: Zoom;
  readonly units: Units;
}

const Views = memo(function Views({ model, scene, layout, places, side, zoom, units }: ViewsProps) {
  const { views } = layout;
  return (
    <>
      <PlanformView {...{ model, scene, units }} box={views.planform} place={places.planform} />
      {ENDS.map((end) => (
        <FaceView key={end} {...{ model, scene, end, units }} box={views[end]} place={places[end]} />
      ))}
      {side.isometric && <IsometricView scene={scene} box={side.isometric} place={places.isometric} />}
      {side.ribs && model.ribs && <RibsView ribs={model.ribs} box={side.ribs} zoom={zoom} />}
    </>
  );
});

/** Without a block the ribs take the place of the block's view. */
function sideOf({ ribs, plan }: PlanModel): SideViews {
  if (!ribs) return 'isometric';
  return plan.block ? 'both' : 'ribs';
}

function remarksOf(units: Units, { plan }: PlanModel): string[] {
  return [
    `Dimensions in ${units === 'mm' ? 'mm' : 'inches'}.`,
    ...(plan.block ? ['Dashed: block and margin.'] : []),
    ...(plan.machine ? [`Machine: ${plan.machine.name}.`] : []),
    ...(plan.material ? [`Foam: ${plan.material.name}.`] : []),
  ];
}
