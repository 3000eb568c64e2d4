import type { DxfEntity } from './dxf-document.ts';
import { dxfText, fixed } from './text.ts';

/** Decimals of lengths in mm: vertices lie within 0.000005 mm in x and y of what was computed. */
export const DXF_DECIMALS = 5;
/** Decimals of bulges: on a piece of 1 m the arc's height is then right within 0.0000001 mm. */
const BULGE_DECIMALS = 10;

/** Collects the pairs of group code and value that a DXF file consists of. */
export class DxfTags {
  private readonly lines: string[] = [];
  private lastHandle: number;

  /** @param firstHandle the first handle that {@link handle} gives out */
  constructor(firstHandle = 1) {
    this.lastHandle = firstHandle - 1;
  }

  /** A handle that no other object of the file has, in hexadecimal. */
  handle(): string {
    this.lastHandle += 1;
    return this.lastHandle.toString(16).toUpperCase();
  }

  /** A keyword, a name or a handle: text that is ours and needs no escape. */
  word(code: number, value: string): this {
    this.lines.push(String(code).padStart(3), value);
    return this;
  }

  whole(code: number, value: number): this {
    return this.word(code, String(Math.round(value)).padStart(6));
  }

  real(code: number, value: number, decimals = DXF_DECIMALS): this {
    return this.word(code, fixed(value, decimals));
  }

  /** Text that a person wrote. */
  text(code: number, value: string): this {
    return this.word(code, dxfText(value));
  }

  /** A point: x under `code`, y under `code + 10`, and z, always 0, under `code + 20` unless `flat`. */
  point(code: number, x: number, y: number, flat = false): this {
    this.real(code, x).real(code + 10, y);
    return flat ? this : this.real(code + 20, 0);
  }

  vertex(vertex: DxfVertex): this {
    return this.word(10, vertex.x).word(20, vertex.y);
  }

  bulge(vertex: DxfVertex): this {
    return vertex.bulge === 0 ? this : this.real(42, vertex.bulge, BULGE_DECIMALS);
  }

  append(other: DxfTags): this {
    for (const line of other.lines) this.lines.push(line);
    return this;
  }

  /** The file's text. Lines end in CR LF: the oldest controllers read nothing else, and all others read it too. */
  toString(): string {
    return `${this.lines.join('\r\n')}\r\n`;
  }
}

export type DxfPolyline = Extract<DxfEntity, { kind: 'polyline' }>;

interface DxfVertex {
  readonly x: string;
  readonly y: string;
  readonly bulge: number;
}

/**
 * The vertices as they are written. Unless repeats are kept, a vertex that rounding puts onto the one after it (in a closed
 * chain also the last onto the first) is left out, so that no piece has zero length.
 */
export function dxfVertices({ chain, closed, keepRepeats }: DxfPolyline): readonly DxfVertex[] {
  const vertices: DxfVertex[] = [];
  for (let i = 0; i < chain.x.length; i += 1) {
    const x = fixed(chain.x[i] ?? NaN, DXF_DECIMALS);
    const y = fixed(chain.y[i] ?? NaN, DXF_DECIMALS);
    const last = vertices.at(-1);
    if (!keepRepeats && last !== undefined && last.x === x && last.y === y) vertices.pop();
    vertices.push({ x, y, bulge: chain.bulge?.[i] ?? 0 });
  }
  const first = vertices[0];
  const last = vertices.at(-1);
  const repeated = vertices.length > 1 && first?.x === last?.x && first?.y === last?.y;
  if (closed && !keepRepeats && repeated) vertices.pop();
  return vertices;
}
