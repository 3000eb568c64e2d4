import { type AccountRole } from '#server/account/person.ts';

export const demoWorkshop = 'Marrow Fen Works';

/** The accounts of the demo workshop; nobody of these names is meant. */
export const demoPeople = [
  { role: 'owner', name: 'Oda Fenlow' },
  { role: 'designer', name: 'Ines Aldam' },
  { role: 'builder', name: 'Tobin Sedgley' },
  { role: 'technician', name: 'Pim Harrowby' },
] as const satisfies readonly { readonly role: AccountRole; readonly name: string }[];

/** owner@marrowfen.example and so on. */
export function demoEmail(role: AccountRole): string {
  return `${role}@marrowfen.example`;
}
