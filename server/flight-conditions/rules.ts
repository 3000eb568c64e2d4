import { refuseField } from '#server/refusal.ts';

/** @throws Refusal naming `archived`: what new estimates begin with stays in use */
export function checkMayBeArchived(condition: { readonly isDefault: boolean }): void {
  if (condition.isDefault) {
    throw refuseField('archived', 'This is the default. Make another one the default first.');
  }
}
