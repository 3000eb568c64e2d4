import { type DxfGroup, dxfNumber, eachDxfGroup } from './dxf-groups.ts';
import { IMPORT_LIMITS, ImportRefusal } from './refusal.ts';

/** The kinds of entity that can be part of an outline. */
export const OUTLINE_ENTITIES = ['LINE', 'ARC', 'LWPOLYLINE', 'POLYLINE', 'SPLINE'] as const;
export type OutlineEntity = (typeof OUTLINE_ENTITIES)[number];

/** An entity of a drawing with its groups; a POLYLINE has those of its vertices as well. */
export interface DxfEntity {
  readonly type: OutlineEntity;
  readonly layer: string;
  readonly line: number;
  readonly groups: readonly DxfGroup[];
  readonly vertices: readonly (readonly DxfGroup[])[];
}

export interface DxfContent {
  readonly entities: readonly DxfEntity[];
  /** Other entities of the drawing by their kind. */
  readonly others: ReadonlyMap<string, number>;
  /** The value of $INSUNITS; null when the drawing does not say. */
  readonly unitCode: number | null;
}

/**
 * The entities of a DXF drawing that can be part of an outline: those of its ENTITIES section. Blocks are not followed.
 * @throws ImportRefusal when the text is no DXF, or holds more points than are read
 */
export function readDxf(text: string): DxfContent {
  const reading = new DxfReading();
  eachDxfGroup(
    text,
    (code) => reading.wants(code),
    (group) => reading.take(group),
  );
  return reading.content();
}

interface OpenEntity {
  readonly type: OutlineEntity;
  readonly line: number;
  layer: string;
  groups: DxfGroup[];
  vertices: DxfGroup[][];
}

function isOutlineEntity(type: string): type is OutlineEntity {
  return (OUTLINE_ENTITIES as readonly string[]).includes(type);
}

/** The codes of an entity that say where it lies: layer, points, radii, knots, weights, bulges, angles, flags, normal. */
const ENTITY_CODES = new Set([8, 10, 11, 20, 21, 30, 31, 40, 41, 42, 50, 51, 70, 71, 210, 220, 230]);
/** Ten values for each point that is read: more than any of the entities has. */
const MOST_VALUES = 10 * IMPORT_LIMITS.points.max;

/** What has been read so far. */
class DxfReading {
  readonly #entities: OpenEntity[] = [];
  readonly #others = new Map<string, number>();
  #section: string | null = null;
  #sections = 0;
  #awaitsName = false;
  #variable = '';
  #unitCode: number | null = null;
  #open: OpenEntity | null = null;
  #vertex: DxfGroup[] | null = null;
  #values = 0;

  /** Whether a group with this code says anything where the reading is. */
  wants(code: number): boolean {
    if (this.#awaitsName) return code === 2;
    if (this.#section === 'HEADER') return code === 9 || code === 70;
    return this.#open !== null && ENTITY_CODES.has(code);
  }

  take(group: DxfGroup): void {
    if (group.code === 0) this.#begin(group);
    else if (group.code === 2 && this.#awaitsName) {
      this.#section = group.value;
      this.#awaitsName = false;
    } else if (this.#section === 'HEADER') this.#header(group);
    else if (this.#open) this.#add(this.#open, group);
  }

  content(): DxfContent {
    if (this.#sections === 0) {
      throw new ImportRefusal('wrong-type', 'The file is no DXF drawing: it has no sections.');
    }
    return { entities: this.#entities, others: this.#others, unitCode: this.#unitCode };
  }

  #begin({ value, line }: DxfGroup): void {
    if (value === 'VERTEX' && this.#open?.type === 'POLYLINE') {
      this.#open.vertices.push((this.#vertex = []));
      return;
    }
    [this.#open, this.#vertex] = [null, null];
    if (value === 'SECTION') {
      this.#awaitsName = true;
      this.#sections++;
    } else if (value === 'ENDSEC') this.#section = null;
    else if (this.#section === 'ENTITIES' && isOutlineEntity(value)) {
      this.#open = { type: value, line, layer: '', groups: [], vertices: [] };
      this.#entities.push(this.#open);
    } else if (this.#section === 'ENTITIES' && value !== 'SEQEND') {
      this.#others.set(value, (this.#others.get(value) ?? 0) + 1);
    }
  }

  #header(group: DxfGroup): void {
    if (group.code === 9) this.#variable = group.value;
    else if (this.#variable === '$INSUNITS' && group.code === 70) this.#unitCode = dxfNumber(group);
  }

  #add(open: OpenEntity, group: DxfGroup): void {
    if (group.code === 8 && !this.#vertex) open.layer = group.value;
    if (++this.#values > MOST_VALUES) {
      throw new ImportRefusal(
        'too-many-points',
        `The drawing has more than ${IMPORT_LIMITS.points.max} points.`,
      );
    }
    (this.#vertex ?? open.groups).push(group);
  }
}
