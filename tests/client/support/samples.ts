import { type Me } from '#server/contracts/people.ts';
import { type Section } from '#server/contracts/sections.ts';

export const idOf = (number: number) => `0198c0de-0000-7000-8000-${String(number).padStart(12, '0')}`;

export function personOf(role: Me['role'], preferences: Partial<Me['preferences']> = {}): Me {
  return {
    id: idOf(1),
    name: 'Ines Varga',
    email: `${role}@marrowfen.example`,
    role,
    workshop: { id: idOf(2), name: 'Marrow Fen Works' },
    preferences: { units: 'mm', theme: 'day', ...preferences },
  };
}

export function sectionOf(number: number, name: string, change: Partial<Section> = {}): Section {
  return {
    id: idOf(100 + number),
    name,
    purpose: 'Outer wing',
    archived: false,
    createdAt: '2024-03-01T10:00:00.000Z',
    updatedAt: '2024-03-02T10:00:00.000Z',
    updatedBy: { id: idOf(1), name: 'Ines Varga' },
    versionCount: 4,
    releasedNumber: 3,
    latest: {
      number: 4,
      status: 'draft',
      description: 'NACA 2412',
      maxThickness: 0.12,
      maxCamber: 0.02,
      shape: {
        kind: 'naca4',
        maxCamber: 0.02,
        maxCamberPosition: 0.4,
        maxThickness: 0.12,
        trailingEdge: 'open',
      },
    },
    ...change,
  };
}
