import { type Point } from '../point.ts';
import { type Polyline, at, boxOf, polylineOf } from './arrays.ts';
import { type Core } from './core.ts';
import { verticalCut } from './feature-ends.ts';
import { type Finding, error } from './findings.ts';
import { type Chain, type Face } from './panel.ts';
import { offsetBoth } from './tail.ts';
import { type Tongue, type TongueEdge, neckOf, tongueFindings, tongueOf } from './template-tongue.ts';
import { ENDS, type End, type Plan, type TemplatePlan } from './plan.ts';
import { PART } from './row.ts';

/** A numbered mark on the template's edge: both people call it out when their end of the wire passes it. */
export interface Tick {
  readonly number: number;
  /** Chord station, 0 … 1. */
  readonly station: number;
  readonly surface: 'upper' | 'lower';
  readonly at: Point;
  /** Unit direction into the template. */
  readonly inwards: Point;
}

/** A template to glide a wire bow along, in the panel's frame at its end. */
export interface Template {
  readonly end: End;
  /** Closed, counter-clockwise, ramp included. */
  readonly outline: Polyline;
  readonly ticks: readonly Tick[];
  readonly pins: readonly Point[];
  readonly pinDiameterMm: number;
  /** Level line: both templates are set up with it parallel to the board, which keeps the washout. */
  readonly reference: Polyline;
  /** Length of the ramp behind the trailing edge, mm: in proportion to the chords, so both ends of the wire arrive together. */
  readonly rampMm: number;
  /** Thickness of the tongue behind the trailing edge, mm. */
  readonly tongueMm: number;
}

/**
 * Root and tip template. The wire glides along the edge, so the edge is the wire's path less the wire's radius: the contour less the skins, half
 * the kerf wider, half the wire's diameter narrower. Behind the trailing edge stands a tongue, along which the wire comes in over the upper and
 * leaves by the lower edge; where the section is thinner than the tongue, the template keeps its thickness instead, and the foam there
 * is sanded to shape. Ticks stand at equal chord stations and carry the same numbers at both ends, in the order of the cut: from the
 * trailing edge over the upper surface to the nose and back by the lower.
 */
export function buildTemplates(
  plan: Plan,
  core: Core,
  rules: TemplatePlan,
): { readonly templates: Template[]; readonly findings: Finding[] } {
  const by = (end: End) => plan.kerfMm[end] / 2 - rules.wireDiameterMm / 2;
  const { root, tip } = offsetBoth(core.panel, { root: by('root'), tip: by('tip') }, []);
  if (!root || !tip) {
    const missing = ENDS.filter((end) => !(end === 'root' ? root : tip));
    const findings = missing.map((end) => {
      const message = `Nothing is left of the template at the ${end}.`;
      return error('skin-thicker-than-section', 'allowances.upperMm', message, { end });
    });
    return { templates: [], findings };
  }
  const lines = { root, tip };
  const neck = neckOf(core, lines);
  const findings: Finding[] = [];
  const templates = ENDS.map((end): Template => {
    const line = lines[end];
    const tongue = tongueOf(core, end, line, neck, rules);
    findings.push(...tongueFindings(core, end, tongue, neck));
    const outline = polylineOf([tongue.upper.outer, ...tongue.kept, tongue.lower.outer]);
    const box = boxOf(line);
    const y = core.panel[end].toPanel({ x: plan.panel.washoutStation, y: 0 }).y;
    const reference = polylineOf([
      { x: box.minX, y },
      { x: box.maxX, y },
    ]);
    const pins = pinsOf(core, end, line, rules, findings);
    const ticks = ticksOf(core, end, line, tongue, rules.ticks);
    const { rampMm, tongueMm } = tongue;
    return { end, outline, ticks, pins, pinDiameterMm: rules.pinDiameterMm, reference, rampMm, tongueMm };
  });
  return { templates, findings };
}

function ticksOf({ panel }: Core, end: End, line: Polyline, tongue: Tongue, count: number): Tick[] {
  const { chain } = panel;
  const face = chain[end];
  const last = Math.max(...chain.station);
  const ticks: Tick[] = [];
  const add = (surface: 'upper' | 'lower', station: number) => {
    const edge = tongue[surface];
    const place =
      station > edge.station && station <= last
        ? onEdge(edge, (station - edge.station) / (last - edge.station))
        : onContour(chain, face, line, surface, station);
    if (place) ticks.push({ number: ticks.length + 1, station, surface, ...place });
  };
  for (let k = 0; k <= count; k++) add('upper', 1 - k / count);
  for (let k = 1; k <= count; k++) add('lower', k / count);
  return ticks;
}

type TickPlace = Pick<Tick, 'at' | 'inwards'>;

function onEdge({ from, abreast, inwards }: TongueEdge, share: number): TickPlace {
  const [x, y] = [from.x + share * (abreast.x - from.x), from.y + share * (abreast.y - from.y)];
  return { at: { x, y }, inwards };
}

/** The place of a station on the contour; null where the contour does not reach it. */
function onContour(
  chain: Chain,
  face: Face,
  line: Polyline,
  surface: 'upper' | 'lower',
  station: number,
): TickPlace | null {
  const pairs = Array.from(chain.part.keys()).filter(
    (i) => chain.part[i] === PART[surface] || chain.part[i] === PART.nose,
  );
  const k = pairs.findIndex((i, n) => {
    const next = pairs[n + 1];
    return next !== undefined && (at(chain.station, i) - station) * (at(chain.station, next) - station) <= 0;
  });
  const [a, b] = [pairs[k], pairs[k + 1]];
  if (a === undefined || b === undefined) return null;
  const way = at(chain.station, b) - at(chain.station, a);
  const share = way === 0 ? 0 : (station - at(chain.station, a)) / way;
  const mix = (of: Float64Array) => at(of, a) + share * (at(of, b) - at(of, a));
  const [nx, ny] = [mix(face.nx), mix(face.ny)];
  const size = Math.hypot(nx, ny);
  return { at: { x: mix(line.x), y: mix(line.y) }, inwards: { x: -nx / size, y: -ny / size } };
}

function pinsOf(
  { panel }: Core,
  end: End,
  line: Polyline,
  rules: TemplatePlan,
  findings: Finding[],
): Point[] {
  return rules.pinStations.flatMap((station, i) => {
    const { x } = panel[end].toPanel({ x: station, y: 0 });
    const cut = verticalCut(line, x);
    if (cut && cut.high - cut.low > 2 * rules.pinDiameterMm) return [{ x, y: (cut.low + cut.high) / 2 }];
    const message = `Pin ${i + 1} has no room in the ${end} template.`;
    findings.push(error('pin-outside-template', `template.pinStations.${i}`, message, { end, station }));
    return [];
  });
}
