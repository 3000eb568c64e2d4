import { expect } from 'vitest';
import { type Point } from '#geometry/point.ts';
import { type Naca4Shape } from '#geometry/shapes/naca4.ts';
import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import {
  type EditorAction,
  type EditorState,
  reduceEditor,
  startState,
} from '#client/sections/editor/editor-state.ts';
import { type HandleId } from '#client/sections/editor/handle-ids.ts';
import { handlePoint } from '#client/sections/editor/handle-points.ts';
import { hasEqualNose } from '#client/sections/editor/present.ts';

export const naca2412: Naca4Shape = {
  kind: 'naca4',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'open',
};

export const freeForm: CstShape = {
  kind: 'cst',
  upper: [0.18, 0.22, 0.2, 0.24],
  lower: [-0.15, -0.1, -0.12, -0.08],
  n1: 0.5,
  n2: 1,
  trailingEdgeGap: 0.002,
};

/** Works the editor without a page: press, move, release, keys, and what is expected of the state. */
export class EditorDriver {
  state: EditorState;
  #time = 0;

  constructor(shape: Shape = naca2412, chordMm = 220) {
    this.state = startState({ shape, chordMm, equalNose: hasEqualNose(shape) }, 3);
  }

  do(action: EditorAction): this {
    this.state = reduceEditor(this.state, action);
    return this;
  }

  press(handle: HandleId): this {
    return this.do({ type: 'drag-start', handle });
  }

  /** Moves the pointer to a distance from where it pressed, in fractions of chord. */
  move(x: number, y: number, snap = false): this {
    return this.do({ type: 'drag-move', by: { x, y }, snap });
  }

  release(): this {
    return this.do({ type: 'drag-end' });
  }

  escape(): this {
    return this.do({ type: 'drag-cancel' });
  }

  wait(ms: number): this {
    this.#time += ms;
    return this;
  }

  key(handle: HandleId, x: number, y: number): this {
    this.#time += 50;
    return this.do({ type: 'nudge', handle, steps: { x, y }, at: this.#time });
  }

  undo(): this {
    return this.do({ type: 'undo' });
  }

  redo(): this {
    return this.do({ type: 'redo' });
  }

  at(handle: HandleId): Point {
    const point = handlePoint(this.state.present.shape, handle);
    if (!point) throw new Error(`This shape has no handle ${handle}.`);
    return point;
  }

  expectDigits(values: Partial<Omit<Naca4Shape, 'kind'>>): this {
    const { shape } = this.state.present;
    if (shape.kind !== 'naca4') throw new Error('The shape is not a 4-digit section.');
    for (const [key, value] of Object.entries(values)) {
      const actual = shape[key as keyof typeof values];
      if (typeof value === 'number') expect(actual, key).toBeCloseTo(value, 12);
      else expect(actual, key).toBe(value);
    }
    return this;
  }

  expectSteps(past: number, future = 0): this {
    expect({ past: this.state.past.length, future: this.state.future.length }).toEqual({ past, future });
    return this;
  }

  expectShape(shape: Shape): this {
    expect(this.state.present.shape).toEqual(shape);
    return this;
  }

  expectNotice(code: NonNullable<EditorState['notice']>['code'] | null): this {
    expect(this.state.notice?.code ?? null).toBe(code);
    return this;
  }

  get freeForm(): CstShape {
    const { shape } = this.state.present;
    if (shape.kind !== 'cst') throw new Error('The shape is not a free form.');
    return shape;
  }
}
