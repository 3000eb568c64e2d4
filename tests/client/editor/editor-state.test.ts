import { describe, expect, it } from 'vitest';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { thicknessDistribution } from '#client/drawing/distribution.ts';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { NUDGE_PAUSE_MS, reduceEditor, startState, UNDO } from '#client/sections/editor/editor-state.ts';
import { EditorDriver, freeForm, naca2412 } from './editor-driver.ts';

describe('a drag', () => {
  it('is one undo step, however many moves it has', () => {
    new EditorDriver()
      .press('camber')
      .move(0.01, 0.001)
      .move(0.02, 0.004)
      .move(0.05, 0.01)
      .expectSteps(0)
      .expectDigits({ maxCamber: 0.03, maxCamberPosition: 0.45 })
      .release()
      .expectSteps(1)
      .expectDigits({ maxCamber: 0.03, maxCamberPosition: 0.45 })
      .undo()
      .expectShape(naca2412)
      .expectSteps(0, 1)
      .redo()
      .expectDigits({ maxCamber: 0.03, maxCamberPosition: 0.45 });
  });

  it('recomputes from its start, so that going back to the start gives the start', () => {
    new EditorDriver()
      .press('camber')
      .move(0.3, 0.05)
      .move(0, 0)
      .release()
      .expectShape(naca2412)
      .expectSteps(0);
  });

  it('is taken back whole by Esc, and the moves that follow change nothing', () => {
    new EditorDriver()
      .press('thickness-upper')
      .move(0, 0.02)
      .escape()
      .expectShape(naca2412)
      .move(0, 0.03)
      .release()
      .expectShape(naca2412)
      .expectSteps(0);
  });

  it('keeps other edits out while it lasts', () => {
    const driver = new EditorDriver().press('camber').move(0, 0.01);
    driver.do({ type: 'set', field: 'maxThickness', value: 0.2 }).undo().key('camber', 0, 1);
    driver.do({ type: 'drag-start', handle: 'nose' });
    driver.expectDigits({ maxThickness: 0.12, maxCamber: 0.03 }).release().expectSteps(1);
  });

  it('of a handle that the shape does not have does not begin', () => {
    expect(new EditorDriver().press('upper-2').state.drag).toBeNull();
    expect(new EditorDriver(freeForm).press('camber').state.drag).toBeNull();
    expect(new EditorDriver(freeForm).press('upper-9').state.drag).toBeNull();
  });

  it('stops at the limits and says so', () => {
    new EditorDriver()
      .press('camber')
      .move(2, 2)
      .expectDigits({ maxCamber: 0.12, maxCamberPosition: 0.9 })
      .expectNotice('limit')
      .move(-2, -2)
      .expectDigits({ maxCamber: 0, maxCamberPosition: 0.1 })
      .move(0, 0)
      .expectNotice(null);
  });

  it('stays at the last shape whose surfaces do not cross, and says why', () => {
    const driver = new EditorDriver(freeForm).press('upper-1').move(0, -0.02);
    const valid = driver.state.present.shape;
    driver
      .move(0, -0.3)
      .expectShape(valid)
      .expectNotice('refused')
      .release()
      .expectShape(valid)
      .expectSteps(1);
  });
});

describe('snapping to whole digits', () => {
  it('holds the values that the handle moves and leaves the others', () => {
    new EditorDriver({ ...naca2412, maxThickness: 0.1234 })
      .press('camber')
      .move(0.07, 0.0061, true)
      .release()
      .expectDigits({ maxCamber: 0.03, maxCamberPosition: 0.5, maxThickness: 0.1234 });
  });

  it('can change while the pointer rests', () => {
    new EditorDriver()
      .press('thickness-lower')
      .move(0, -0.0032, true)
      .expectDigits({ maxThickness: 0.13 })
      .move(0, 0, false)
      .expectDigits({ maxThickness: 0.12 });
  });
});

describe('arrow keys', () => {
  it('move by 0.05 % of chord and join to one step on one handle', () => {
    new EditorDriver()
      .key('camber', 0, 1)
      .key('camber', 0, 1)
      .key('camber', 10, 0)
      .expectDigits({ maxCamber: 0.021, maxCamberPosition: 0.405 })
      .expectSteps(1)
      .undo()
      .expectShape(naca2412);
  });

  it('begin a new step after a pause, on another handle, and after another action', () => {
    new EditorDriver()
      .key('camber', 0, 1)
      .wait(NUDGE_PAUSE_MS)
      .key('camber', 0, 1)
      .expectSteps(2)
      .key('thickness-upper', 0, 1)
      .expectSteps(3)
      .key('camber', 0, 1)
      .expectSteps(4)
      .undo()
      .key('camber', 0, 1)
      .expectSteps(4);
  });

  it('move each thickness handle outwards to thicken', () => {
    new EditorDriver()
      .key('thickness-upper', 0, 2)
      .key('thickness-lower', 0, -2)
      .expectDigits({ maxThickness: 0.122 });
    new EditorDriver().key('thickness-lower', 0, 2).expectDigits({ maxThickness: 0.119 });
  });

  it('move the surface at a weight by the step exactly', () => {
    const driver = new EditorDriver(freeForm);
    const before = driver.at('lower-2');
    driver.key('lower-2', 0, -4);
    const after = driver.at('lower-2');
    expect(after.x).toBeCloseTo(before.x, 12);
    expect(after.y).toBeCloseTo(before.y - 4 * 0.0005, 12);
  });

  it('turn the trailing edge of a 4-digit section open and closed', () => {
    new EditorDriver()
      .key('edge', 0, -1)
      .expectDigits({ trailingEdge: 'closed' })
      .key('edge', 0, 1)
      .expectDigits({ trailingEdge: 'open' });
  });

  it('go to the ends of the range', () => {
    new EditorDriver()
      .do({ type: 'to-limit', handle: 'camber', end: 'largest' })
      .expectDigits({ maxCamber: 0.12, maxCamberPosition: 0.4 })
      .do({ type: 'to-limit', handle: 'camber', end: 'smallest' })
      .expectDigits({ maxCamber: 0 })
      .expectSteps(2);
    new EditorDriver(freeForm)
      .do({ type: 'to-limit', handle: 'upper-1', end: 'smallest' })
      .expectShape(freeForm)
      .expectNotice('refused');
  });
});

describe('typed values', () => {
  it('are one step each; the same value is none', () => {
    new EditorDriver()
      .do({ type: 'set', field: 'maxThickness', value: 0.15 })
      .do({ type: 'set', field: 'maxThickness', value: 0.15 })
      .do({ type: 'set', field: 'chordMm', value: 180 })
      .expectSteps(2)
      .undo()
      .expectDigits({ maxThickness: 0.15 })
      .expectSteps(1, 1);
  });

  it('out of range are refused and change nothing', () => {
    new EditorDriver()
      .do({ type: 'set', field: 'maxThickness', value: 0.41 })
      .expectShape(naca2412)
      .expectNotice('refused')
      .do({ type: 'set', field: 'chordMm', value: Number.NaN })
      .expectSteps(0);
  });

  it('a nose radius of a 4-digit section sets its thickness, and says so', () => {
    new EditorDriver()
      .do({ type: 'set', field: 'noseRadius', value: (0.18 * 5 * 0.2969) ** 2 / 2 })
      .expectDigits({ maxThickness: 0.18 })
      .expectNotice('nose-follows-thickness');
  });
});

describe('operations', () => {
  it('turns a 4-digit section into a free form that lies where it lay', () => {
    const driver = new EditorDriver()
      .do({ type: 'to-free-form', order: 8 })
      .expectNotice('converted')
      .expectSteps(1);
    expect(driver.freeForm.upper).toHaveLength(9);
    expect(driver.state.notice?.code === 'converted' && driver.state.notice.residual).toBeLessThan(2e-4);
    const [before, after] = [drawSection(naca2412), drawSection(driver.freeForm)].map(thicknessDistribution);
    before?.camber.forEach(({ y }, i) => {
      expect(Math.abs(y - (after?.camber[i]?.y ?? Number.NaN))).toBeLessThan(3e-4);
    });
    driver.undo().expectShape(naca2412);
  });

  it('goes back to the nearest 4-digit section', () => {
    const driver = new EditorDriver()
      .do({ type: 'to-free-form', order: 10 })
      .do({ type: 'to-digits' })
      .expectSteps(2)
      .expectDigits({ trailingEdge: 'open' });
    expect(driver.state.notice?.code).toBe('digits-taken');
    expect(driver.state.notice?.code === 'digits-taken' && driver.state.notice.deviation).toBeLessThan(5e-4);
  });

  it('raises the order without moving the outline', () => {
    const driver = new EditorDriver(freeForm)
      .do({ type: 'order', surface: 'both', order: 7 })
      .expectNotice('order-raised');
    expect(driver.freeForm.lower).toHaveLength(8);
    for (const t of [0.1, 0.35, 0.6, 0.9]) {
      expect(outlineOf(driver.freeForm).upper.at(t).y).toBeCloseTo(outlineOf(freeForm).upper.at(t).y, 12);
    }
    driver.undo().expectShape(freeForm);
  });

  it('lowers the order of one surface and states how far the outline moved', () => {
    const driver = new EditorDriver(freeForm).do({ type: 'order', surface: 'upper', order: 2 });
    expect(driver.freeForm.upper).toHaveLength(3);
    expect(driver.freeForm.lower).toHaveLength(4);
    expect(driver.state.notice).toMatchObject({ code: 'order-lowered', order: 2 });
  });

  it('keeps the nose radius equal on both sides once asked to', () => {
    const driver = new EditorDriver(freeForm).do({ type: 'equal-nose', on: true });
    expect(driver.freeForm.lower[0]).toBe(-0.18);
    driver.press('lower-0').move(0, -0.01).release();
    expect(driver.freeForm.upper[0]).toBe(-(driver.freeForm.lower[0] ?? 0));
    driver.do({ type: 'set', field: 'upper-0', value: 0.3 });
    expect(driver.freeForm.lower[0]).toBe(-0.3);
    driver.do({ type: 'equal-nose', on: false }).do({ type: 'set', field: 'upper-0', value: 0.25 });
    expect(driver.freeForm.lower[0]).toBe(-0.3);
  });

  it('puts an older version on the sheet as one step', () => {
    new EditorDriver()
      .do({ type: 'set-shape', shape: freeForm, notice: { code: 'restored', number: 1 } })
      .expectShape(freeForm)
      .expectNotice('restored')
      .undo()
      .expectShape(naca2412);
  });
});

describe('the history', () => {
  it('forgets what was undone once something else is done', () => {
    new EditorDriver()
      .do({ type: 'edge', trailingEdge: 'closed' })
      .undo()
      .do({ type: 'set', field: 'maxCamber', value: 0.03 })
      .expectSteps(1, 0)
      .redo()
      .expectDigits({ maxCamber: 0.03, trailingEdge: 'open' });
  });

  it('does nothing at its ends', () => {
    new EditorDriver().undo().redo().expectShape(naca2412).expectSteps(0);
  });

  it('keeps its steps when the work is saved or set on a newer version', () => {
    const driver = new EditorDriver().do({ type: 'set', field: 'maxCamber', value: 0.03 });
    driver.do({ type: 'saved', number: 4 }).expectSteps(1);
    expect(driver.state.basedOn).toBe(4);
    driver.do({ type: 'rebase', number: 6 }).undo().expectShape(naca2412);
    expect(driver.state.basedOn).toBe(6);
  });

  it('is as the table of actions says', () => {
    const present = { shape: naca2412, chordMm: 220, equalNose: false };
    const steps = {
      'to-limit': { type: 'to-limit', handle: 'camber', end: 'largest' },
      set: { type: 'set', field: 'maxCamber', value: 0.03 },
      'set-shape': { type: 'set-shape', shape: freeForm },
      'to-free-form': { type: 'to-free-form', order: 6 },
      edge: { type: 'edge', trailingEdge: 'closed' },
      nudge: { type: 'nudge', handle: 'camber', steps: { x: 0, y: 1 }, at: 0 },
    } as const;
    for (const [name, action] of Object.entries(steps)) {
      const after = reduceEditor(startState(present, 1), action);
      expect(after.past.length, name).toBe(1);
      expect(['step', 'joins']).toContain(UNDO[action.type]);
    }
  });
});
