/** Who may do what: the only table of permissions. Routes name a permission, screens ask the same table. */
export const roles = ['owner', 'designer', 'builder', 'technician', 'guest'] as const;
export type Role = (typeof roles)[number];

/** Roles of people who sign in; a guest holds a share link and has no account. */
export const accountRoles = ['owner', 'designer', 'builder', 'technician'] as const;

/**
 * `released.read` sees released versions only; `sections.read` sees every section, draft and version.
 * A guest has none of these: a share link opens its one item and nothing else.
 */
export const permissions = {
  'account.own': ['owner', 'designer', 'builder', 'technician'],
  'released.read': ['owner', 'designer', 'builder', 'technician'],
  'sections.read': ['owner', 'designer', 'builder'],
  'sections.write': ['owner', 'designer'],
  'versions.release': ['owner', 'designer'],
  'files.download': ['owner', 'designer', 'builder', 'technician'],
  'downloads.read': ['owner', 'designer', 'builder'],
  'cut-sheets.read': ['owner', 'designer', 'builder'],
  'cut-sheets.write': ['owner', 'designer', 'builder'],
  'cut-sheets.release': ['owner', 'designer', 'builder'],
  'cuts.log': ['owner', 'designer', 'builder', 'technician'],
  'inspections.write': ['owner', 'designer', 'builder', 'technician'],
  'inspections.answer': ['owner', 'designer', 'builder'],
  'shop.read': ['owner', 'designer', 'builder', 'technician'],
  'shop.write': ['owner', 'builder'],
  'flight-conditions.read': ['owner', 'designer', 'builder', 'technician'],
  'flight-conditions.write': ['owner', 'designer'],
} as const satisfies Record<string, readonly Role[]>;
export type Permission = keyof typeof permissions;

export function may(role: Role, permission: Permission): boolean {
  return (permissions[permission] as readonly Role[]).includes(role);
}
