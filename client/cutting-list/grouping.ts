import { type CuttingListItem, type CutLog } from '#server/contracts/cutting-list.ts';
import { type OutboxEntry } from './outbox.ts';

interface Group {
  readonly key: string;
  readonly title: string;
  readonly items: readonly CuttingListItem[];
}

/** The list by machine and material, in the order of their names; what needs no machine comes last. */
export function groupsOf(items: readonly CuttingListItem[]): Group[] {
  const groups = new Map<string, { title: string; items: CuttingListItem[] }>();
  for (const item of items) {
    const title = titleOf(item);
    const key = `${item.machine?.id ?? ''} ${item.material?.id ?? ''}`;
    const group = groups.get(key) ?? { title, items: [] };
    group.items.push(item);
    groups.set(key, group);
  }
  return [...groups]
    .map(([key, group]) => ({ key, ...group }))
    .sort((a, b) => rank(a) - rank(b) || a.title.localeCompare(b.title));
}

const rank = ({ items }: { readonly items: readonly CuttingListItem[] }) =>
  items[0]?.machine === null ? 1 : 0;

function titleOf({ machine, material, part }: CuttingListItem): string {
  if (machine === null) return part === 'templates' ? 'By hand: templates' : 'By hand';
  return material === null ? machine.name : `${machine.name}, ${material.name}`;
}

/** The list as it will stand once the entries that wait for the network have arrived. */
export function withPending(
  items: readonly CuttingListItem[],
  entries: readonly OutboxEntry[],
  me: CutLog['person'],
): CuttingListItem[] {
  return items.map((item) =>
    entries
      .filter(({ refusal }) => refusal === null)
      .map(({ log }) => log)
      .filter(
        (log) =>
          log.sheetId === item.sheetId && log.versionNumber === item.versionNumber && log.part === item.part,
      )
      .reduce<CuttingListItem>((so, log) => {
        const count = log.quantity ?? 1;
        if (log.action === 'started') return { ...so, started: { by: me, at: log.at, machine: so.machine } };
        if (log.action === 'done') return { ...so, started: null, done: so.done + count };
        return { ...so, started: null, scrapped: so.scrapped + count };
      }, item),
  );
}
