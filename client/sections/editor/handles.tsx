import { type Point } from '#geometry/point.ts';
import { type Units } from '#client/app/units.ts';
import { type Box, type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { type SheetTransform } from '#client/drawing/sheet-view.ts';
import { type EditorAction, type EditorState } from './editor-state.ts';
import { handlePoint } from './handle-points.ts';
import { handleWords } from './handle-words.ts';
import { handleIds, type HandleId } from './handle-ids.ts';
import { HandleMark } from './handle-mark.tsx';
import { isSwitch } from './handle-moves.ts';
import { ValueTag } from './value-tag.tsx';

interface HandlesProps {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly state: EditorState;
  readonly dispatch: (action: EditorAction) => void;
  readonly snap: boolean;
  readonly selected: HandleId | null;
  readonly onSelect: (handle: HandleId | null) => void;
  readonly units: Units;
}

/** All handles of the section that are in sight or have the focus, and the value of the one in hand. */
export function Handles({
  layout,
  transform,
  state,
  dispatch,
  snap,
  selected,
  onSelect,
  units,
}: HandlesProps) {
  const { present, drag } = state;
  const { shape, chordMm } = present;
  const { section } = layout;
  const marks = handleIds(shape).flatMap((handle) => {
    const dragged = drag?.handle === handle;
    const at = dragged ? drag.at : handlePoint(shape, handle);
    if (!at) return [];
    const place = { x: transform.toX(at.x), y: transform.toY(at.y) };
    const near = within(place, section);
    const inSight = near.x === place.x && near.y === place.y;
    if (!inSight && !dragged && selected !== handle) return [];
    // With the focus on it, a mark that the keys carry out of sight waits at the edge of the view.
    const { x, y } = dragged ? place : near;
    return [{ handle, dragged, x, y, words: handleWords(shape, handle, at, chordMm, units) }];
  });
  const held = marks.find(({ dragged }) => dragged);
  return (
    <g>
      {marks.map(({ handle, dragged, x, y, words }) => (
        <HandleMark
          key={handle}
          handle={handle}
          x={x}
          y={y}
          name={words.name}
          value={words.value}
          min={words.min}
          max={words.max}
          spoken={words.spoken}
          kind={isSwitch(shape, handle) ? 'switch' : handle === 'camber' ? 'plane' : 'slider'}
          selected={selected === handle}
          dragged={dragged}
          transform={transform}
          snap={snap}
          dispatch={dispatch}
          onSelect={onSelect}
        />
      ))}
      {held && <ValueTag x={held.x} y={held.y} text={held.words.tag} layout={layout} />}
    </g>
  );
}

/** The nearest place inside a box. */
function within({ x, y }: Point, box: Box): Point {
  return {
    x: Math.min(box.x + box.width, Math.max(box.x, x)),
    y: Math.min(box.y + box.height, Math.max(box.y, y)),
  };
}
