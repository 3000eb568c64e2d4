import { type AccountRole } from '#server/account/person.ts';
import { type Desk } from '#server/contracts/cutting-list.ts';

type DeskList = keyof Desk;

/** What waits for whom. The technician's desk is the cutting list. */
const lists: Readonly<Record<AccountRole, readonly DeskList[]>> = {
  owner: ['drafts', 'recentSections', 'outOfTolerance', 'unplanned', 'sheetsInWork', 'staleSheets'],
  designer: ['drafts', 'recentSections', 'outOfTolerance', 'staleSheets'],
  builder: ['drafts', 'outOfTolerance', 'unplanned', 'sheetsInWork', 'staleSheets'],
  technician: [],
};

/** Whether a list stands on the desk of a role. */
export function isOnDesk(role: AccountRole, list: DeskList): boolean {
  return lists[role].includes(list);
}
