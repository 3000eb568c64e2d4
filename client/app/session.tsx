import { useSuspenseQuery } from '@tanstack/react-query';
import { meQuery } from '#client/api/me.ts';
import { type Me } from '#server/contracts/people.ts';
import { may, type Permission } from '#server/contracts/permissions.ts';

export { signIn, SignInError, signOut } from './sign-in.ts';

/** The signed-in person. The router has fetched it before any screen below the shell is shown. */
export function useMe(): Me {
  return useSuspenseQuery(meQuery()).data;
}

/** Whether the signed-in person's role has a permission; the server asks the same table. */
export function useMay(permission: Permission): boolean {
  return may(useMe().role, permission);
}

/** Where each role's work begins: at the machines, or at the desk. */
export function startOf(me: Me): string {
  return me.role === 'technician' ? '/cutting-list' : '/';
}

/** The address to return to after signing in: a path of this site only, never another site's. */
export function returnPath(to: string | null): string {
  if (
    to === null ||
    !to.startsWith('/') ||
    to.startsWith('//') ||
    to.startsWith('/\\') ||
    to.startsWith('/sign-in')
  )
    return '/';
  return to;
}
