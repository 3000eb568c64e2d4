import { type Shape } from '#geometry/shapes/shape.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { idOf } from '#tests/client/support/samples.ts';

export const naca4 = (maxThickness: number, maxCamber = 0.02): Shape => ({
  kind: 'naca4',
  maxCamber,
  maxCamberPosition: maxCamber === 0 ? 0 : 0.4,
  maxThickness,
  trailingEdge: 'open',
});

export const freeForm = (upper: readonly number[]): Shape => ({
  kind: 'cst',
  n1: 0.5,
  n2: 1,
  upper: [...upper],
  lower: [-0.17, -0.12, -0.14],
  trailingEdgeGap: 0.002,
});

export const SECTION = idOf(101);

export function versionOf(
  number: number,
  shape: Shape,
  change: Partial<SectionVersion> = {},
): SectionVersion {
  return {
    id: idOf(200 + number),
    sectionId: SECTION,
    sectionName: 'Heron outer panel',
    number,
    basedOn: null,
    status: 'draft',
    statusReason: '',
    statusBy: null,
    statusAt: null,
    shape,
    description: `NACA-like ${number}`,
    checksum: 'ab'.repeat(32),
    note: '',
    author: { id: idOf(1), name: 'Ines Varga' },
    createdAt: '2024-03-01T10:00:00.000Z',
    ...change,
  };
}
