import { type Units } from '#client/app/units.ts';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
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

/** All handles of the section that are in sight, and the value of the one in hand. */
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
    const x = transform.toX(at.x);
    const y = transform.toY(at.y);
    const inSight =
      x >= section.x && x <= section.x + section.width && y >= section.y && y <= section.y + section.height;
    if (!inSight && !dragged) return [];
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
