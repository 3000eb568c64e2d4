import { type Point } from '../point.ts';
import { type Polyline, areaOf, at, between, boxOf } from './arrays.ts';
import { type Core } from './core.ts';
import { type PlacedFeature } from './features.ts';
import { type Finding, error, mm, note, warning } from './findings.ts';
import { type Hole, lighteningHoles, roomsAlong } from './lightening.ts';
import { type SheetLayout, packRibs } from './packing.ts';
import { faceAt } from './panel.ts';
import { offsetInStep } from './offset.ts';
import { type Plan, type RibsPlan } from './plan.ts';
import { strokeText, strokeWidth } from './strokes.ts';
import { type Change, notchOf, splitByStrips, tabOf, withChanges, withoutDoubles } from './rib-outline.ts';

/** One rib, in the panel's frame at its station: chord of the root level, so that all ribs stand alike on a flat board. */
export interface Rib {
  /** Counted from 1 at the root: engraved. */
  readonly number: number;
  /** Station of its outline from the root face, mm. */
  readonly spanMm: number;
  /** Closed outlines to cut, counter-clockwise: one, or more where a strip divides the rib. */
  readonly outlines: readonly Polyline[];
  /** Round holes: tubes first, then lightening holes. */
  readonly tubes: readonly Polyline[];
  readonly holes: readonly Hole[];
  /** Lines to engrave: the level line, the lower surface where a tab is cut off later, and the number in single strokes. */
  readonly engraved: readonly Polyline[];
  /** The number's middle and height; its strokes are among `engraved`, none where there is no room. */
  readonly label: { readonly text: string; readonly at: Point; readonly heightMm: number };
  readonly areaMm2: number;
}

export interface RibSet {
  readonly ribs: readonly Rib[];
  readonly layout: SheetLayout;
  /** Height of the board under the jig tabs in the panel's frame; null without tabs. */
  readonly boardY: number | null;
}

/**
 * The ribs of a panel: at each station the true ruled section, inset by the sheeting, with notches and holes for the spars, lightening holes, jig tabs
 * down to one flat board and a number; packed on sheets. A rib's outline is taken at that of its two faces whose chord is larger, so
 * that a square cut leaves enough to bevel; the end ribs stand within the panel.
 */
export function buildRibs(
  plan: Plan,
  core: Core,
  features: readonly PlacedFeature[],
  rules: RibsPlan,
): { readonly set: RibSet; readonly findings: Finding[] } {
  const findings: Finding[] = [];
  const stations = ribStations(plan, rules, findings);
  const bodies = stations.flatMap((spanMm, index) => {
    const body = bodyAt(plan, core, spanMm);
    if (body) return [{ number: index + 1, spanMm, body }];
    const message = `Nothing is left of rib ${index + 1} between the sheetings.`;
    findings.push(error('sheeting-thicker-than-section', 'allowances.upperMm', message, { spanMm }));
    return [];
  });
  const lowest = Math.min(...bodies.map(({ body }) => boxOf(body).minY));
  const boardY = rules.jigTabs && bodies.length > 0 ? lowest - rules.jigTabs.heightMm : null;
  const ribs = bodies.map((of) => ribOf({ plan, core, features, rules, boardY, findings }, of));
  const layout = packRibs(ribs, rules.sheet);
  for (const number of layout.tooLarge) {
    const message = `Rib ${number} does not fit on a sheet of ${mm(rules.sheet.widthMm)} by ${mm(rules.sheet.heightMm)}.`;
    findings.push(error('rib-larger-than-sheet', 'ribs.sheet.widthMm', message));
  }
  return { set: { ribs, layout, boardY }, findings };
}

function evenly(count: number, span: number): number[] {
  return Array.from({ length: count }, (_, i) => (count === 1 ? 0 : (i * span) / (count - 1)));
}

/** Stations of the outlines: each at the face of its rib that has the larger chord. */
function ribStations(plan: Plan, rules: RibsPlan, findings: Finding[]): number[] {
  const span = plan.panel.spanMm;
  const thick = rules.materialThicknessMm;
  const wanted = rules.stations.kind === 'list' ? rules.stations.mm : evenly(rules.stations.count, span);
  wanted.forEach((station, i) => {
    if (station <= span) return;
    const message = `Rib ${i + 1} at ${mm(station)} lies beyond the span of ${mm(span)}.`;
    findings.push(error('rib-outside-panel', `ribs.stations.mm.${i}`, message, { spanMm: station }));
  });
  const sorted = wanted.filter((station) => station <= span).sort((a, b) => a - b);
  sorted.slice(1).forEach((station, i) => {
    if (station - at(sorted, i) >= thick) return;
    const message = `Ribs ${i + 1} and ${i + 2} stand closer than their thickness of ${mm(thick)}.`;
    findings.push(warning('ribs-too-close', 'ribs.stations', message, { spanMm: station }));
  });
  const larger = plan.panel.root.chordMm >= plan.panel.tip.chordMm ? -1 : 1;
  return sorted.map((station) => {
    const middle = Math.min(Math.max(station, thick / 2), Math.max(thick / 2, span - thick / 2));
    return Math.min(span, Math.max(0, middle + (larger * thick) / 2));
  });
}

function bodyAt(plan: Plan, core: Core, spanMm: number): Polyline | null {
  const body = offsetInStep(faceAt(core.panel, spanMm / plan.panel.spanMm), 0);
  return body && withoutDoubles(body);
}

interface Setting {
  readonly plan: Plan;
  readonly core: Core;
  readonly features: readonly PlacedFeature[];
  readonly rules: RibsPlan;
  readonly boardY: number | null;
  readonly findings: Finding[];
}

function ribOf(
  setting: Setting,
  { number, spanMm, body }: { readonly number: number; readonly spanMm: number; readonly body: Polyline },
): Rib {
  const { plan, features, rules, boardY, findings } = setting;
  const share = spanMm / plan.panel.spanMm;
  const notches = features
    .map((of) => notchOf(body, of, share, rules.fitAllowanceMm))
    .filter((of) => of !== null);
  const tabs = rules.jigTabs && boardY !== null ? tabsAt(setting, body, share, boardY) : [];
  findings.push(...clashes(tabs, notches, spanMm));
  const outline = withChanges(body, [...notches, ...tabs]);
  const tubes = features
    .filter(({ feature }) => feature.kind === 'tube')
    .map((of) => grown(of, share, rules.fitAllowanceMm));
  const strips = features
    .filter(({ feature }) => feature.kind === 'strip')
    .map((of) => stripAt(of, share, rules.fitAllowanceMm));
  const obstacles = [...tubes.map(circleAround), ...strips.map(({ fore, aft }) => standing(body, fore, aft))];
  const holes = rules.lighteningHoles ? lighteningHoles(outline, body, obstacles, rules.lighteningHoles) : [];
  const outlines = splitByStrips(outline, strips);
  const areaMm2 =
    outlines.reduce((sum, of) => sum + areaOf(of), 0) -
    tubes.reduce((sum, of) => sum + Math.abs(areaOf(of)), 0) -
    holes.reduce((sum, { radius }) => sum + Math.PI * radius * radius, 0);
  const level = boardY === null ? [] : [levelLine(body)].filter((of) => of !== null);
  const removed = tabs.map(({ aft, fore }) => lowerBetween(body, fore, aft));
  const { strokes, ...label } = labelAt(setting, number, outline, body, [...obstacles, ...holes]);
  const engraved = [...level, ...removed, ...strokes];
  return { number, spanMm, outlines, tubes, holes, engraved, label, areaMm2 };
}

function tabsAt({ plan, core, rules, findings }: Setting, body: Polyline, share: number, boardY: number) {
  const { jigTabs } = rules;
  if (!jigTabs) return [];
  return jigTabs.stations.flatMap((station, i) => {
    const [root, tip] = [core.panel.root, core.panel.tip].map((of) => of.toPanel({ x: station, y: 0 }).x);
    const tab = tabOf(body, (1 - share) * (root ?? 0) + share * (tip ?? 0), jigTabs.widthMm, boardY);
    if (tab) return [tab];
    const spanMm = share * plan.panel.spanMm;
    const message = `Jig tab ${i + 1} does not stand under the rib at ${mm(spanMm, 0)}.`;
    findings.push(error('tab-outside-rib', `ribs.jigTabs.stations.${i}`, message, { spanMm }));
    return [];
  });
}

/** Tabs that stand in a notch of the lower surface or in one another. */
function clashes(tabs: readonly Change[], notches: readonly Change[], spanMm: number): Finding[] {
  const lower = notches.filter(({ surface }) => surface === 'lower');
  return tabs.flatMap((tab, i) => {
    const others = [...lower, ...tabs.slice(0, i)];
    if (!others.some((of) => tab.fore < of.aft && of.fore < tab.aft)) return [];
    const message = `Jig tab ${i + 1} meets a notch or the other tab on the rib at ${mm(spanMm, 0)}.`;
    return [error('tab-meets-notch', `ribs.jigTabs.stations.${i}`, message, { spanMm })];
  });
}

/** A tube's hole at a station, widened by the fit allowance. */
function grown(feature: PlacedFeature, share: number, allowance: number): Polyline {
  const ring = between(feature.root.outline, feature.tip.outline, share);
  const { minX, maxX, minY, maxY } = boxOf(ring);
  const [cx, cy] = [(minX + maxX) / 2, (minY + maxY) / 2];
  const scale = 1 + allowance / (maxY - minY);
  return { x: ring.x.map((x) => cx + scale * (x - cx)), y: ring.y.map((y) => cy + scale * (y - cy)) };
}

function stripAt(feature: PlacedFeature, share: number, allowance: number): { fore: number; aft: number } {
  const { minX, maxX } = boxOf(between(feature.root.outline, feature.tip.outline, share));
  return { fore: minX - allowance / 2, aft: maxX + allowance / 2 };
}

function circleAround(ring: Polyline): Hole {
  const { minX, maxX, minY, maxY } = boxOf(ring);
  const [x, y] = [(minX + maxX) / 2, (minY + maxY) / 2];
  const radius = Math.max(...ring.x.map((value, i) => Math.hypot(value - x, at(ring.y, i) - y)));
  return { x, y, radius };
}

/** A strip stands in the way over the whole height. */
function standing(body: Polyline, fore: number, aft: number): Hole {
  const { minY, maxY } = boxOf(body);
  return { x: (fore + aft) / 2, y: (minY + maxY) / 2, radius: Math.hypot(aft - fore, maxY - minY) / 2 };
}

/** The part of the lower surface that a tab hides: engraved, so that the tab comes off along it. */
function lowerBetween(body: Polyline, fore: number, aft: number): Polyline {
  const foremost = body.x.reduce((best, x, i) => (x < at(body.x, best) ? i : best), 0);
  const inside = Array.from(body.x.keys()).filter(
    (i) => i > foremost && at(body.x, i) > fore && at(body.x, i) < aft,
  );
  return {
    x: Float64Array.from(inside, (i) => at(body.x, i)),
    y: Float64Array.from(inside, (i) => at(body.y, i)),
  };
}

/** A level line across the rib at the height of its middle. */
function levelLine(body: Polyline): Polyline | null {
  const { minY, maxY } = boxOf(body);
  const y = (minY + maxY) / 2;
  const crossings: number[] = [];
  for (let b = 0, a = body.x.length - 1; b < body.x.length; a = b++) {
    const [ay, by] = [at(body.y, a), at(body.y, b)];
    if (ay > y === by > y) continue;
    crossings.push(at(body.x, a) + ((y - ay) / (by - ay)) * (at(body.x, b) - at(body.x, a)));
  }
  if (crossings.length < 2) return null;
  return { x: Float64Array.of(Math.min(...crossings), Math.max(...crossings)), y: Float64Array.of(y, y) };
}

/** Numbers lower than this are not legible, mm; common practice. */
const LEAST_NUMBER_MM = 1;

/** Where the number has most room beside holes and edges; smaller where there is too little. */
function labelAt(
  { rules, findings }: Setting,
  number: number,
  outline: Polyline,
  body: Polyline,
  holes: readonly Hole[],
): Rib['label'] & { readonly strokes: readonly Polyline[] } {
  const room = roomsAlong(outline, body)
    .map(({ x, y, radius }) => ({
      x,
      y,
      radius: Math.min(radius, ...holes.map((of) => Math.hypot(x - of.x, y - of.y) - of.radius)),
    }))
    .reduce((best, of) => (of.radius > best.radius ? of : best));
  const text = String(number);
  // A box of the number's width and height lies in the round room.
  const most = (2 * room.radius) / Math.hypot(strokeWidth(text), 1);
  const place = { text, at: { x: room.x, y: room.y } };
  if (most < LEAST_NUMBER_MM) {
    const message = `Rib ${number} has no room for its number: write it on by hand.`;
    findings.push(warning('number-without-room', 'ribs.numberHeightMm', message));
    return { ...place, heightMm: LEAST_NUMBER_MM, strokes: [] };
  }
  const heightMm = Math.min(rules.numberHeightMm, most);
  if (heightMm < rules.numberHeightMm) {
    const message = `The number of rib ${number} is engraved ${mm(heightMm, 1)} high, because there is no room for more.`;
    findings.push(note('number-smaller', 'ribs.numberHeightMm', message));
  }
  return { ...place, heightMm, strokes: strokeText(text, place.at, heightMm) };
}
