import { Link } from 'react-router';
import { type ShopItem, type ShopSort } from '#client/api/shop.ts';
import { Moment } from '#client/ui/moment.tsx';
import { Skeleton } from '#client/ui/skeleton.tsx';
import { linkIdOf, searchOf } from './address.ts';
import { KIND_WORDS, NONE } from './words.ts';

export interface Column<Item> {
  readonly head: string;
  readonly text: (item: Item) => string;
  readonly width: string;
  readonly end?: boolean;
}

export interface ItemTableProps<Item extends ShopItem> {
  sort: ShopSort;
  caption: string;
  /** Null while they are on their way: skeleton rows of the true size stand in. */
  items: readonly Item[] | null;
  columns: readonly Column<Item>[];
  /** The one at the side. */
  chosen: string | null;
  archive: boolean;
}

const CELL = 'h-12 px-2 py-1 align-middle';
/** Columns whose content stands under the name where there is no room for them. */
const ROOMY = 'max-xl:hidden';

/** Machines or materials. Widths are fixed, so that nothing moves when rows come in. */
export function ItemTable<Item extends ShopItem>(props: ItemTableProps<Item>) {
  const { caption, items, columns } = props;
  return (
    <table className="w-full table-fixed border-collapse text-xs" aria-busy={items === null}>
      <caption className="sr-only">{caption}</caption>
      <colgroup>
        <col />
        {columns.map(({ head, width }) => (
          <col key={head} className={`${width} ${ROOMY}`} />
        ))}
        <col className="w-34 max-sm:hidden" />
      </colgroup>
      <thead>
        <tr className="border-b border-edge text-graphite">
          <th scope="col" className="h-8 px-2 text-left font-normal">
            Name
          </th>
          {columns.map(({ head, end }) => (
            <th
              key={head}
              scope="col"
              className={`px-2 font-normal ${ROOMY} ${end ? 'text-right' : 'text-left'}`}
            >
              {head}
            </th>
          ))}
          <th scope="col" className="px-2 text-left font-normal max-sm:hidden">
            Changed
          </th>
        </tr>
      </thead>
      <tbody>
        {items === null
          ? [0, 1, 2].map((row) => <SkeletonRow key={row} columns={columns.length} />)
          : items.map((item) => <Row key={item.id} {...props} item={item} />)}
      </tbody>
    </table>
  );
}

function Row<Item extends ShopItem>(props: ItemTableProps<Item> & { item: Item }) {
  const { item, sort, columns, chosen, archive } = props;
  const place = { at: sort, id: item.id };
  return (
    <tr
      className={`relative border-b border-rule hover:bg-sheet focus-within:bg-sheet ${item.id === chosen ? 'bg-sheet shadow-[inset_3px_0_0_var(--wire)]' : ''}`}
    >
      <th scope="row" className={`${CELL} text-left font-normal`}>
        <Link
          id={linkIdOf(place)}
          to={searchOf(place, archive)}
          preventScrollReset
          aria-current={item.id === chosen ? 'true' : undefined}
          className="block truncate text-sm font-semibold after:absolute after:inset-0"
          title={item.name}
        >
          {item.name}
        </Link>
        <span className="block truncate text-graphite">
          {KIND_WORDS[item.settings.kind]}
          {item.archived && ', in the archive'}
        </span>
        <span className="block text-graphite xl:hidden">
          {columns
            .map(({ text }) => text(item))
            .filter((text) => text !== NONE)
            .join(' · ')}
        </span>
      </th>
      {columns.map(({ head, text, end }) => (
        <td key={head} className={`${CELL} ${ROOMY} ${end ? 'text-right' : ''}`}>
          {text(item)}
        </td>
      ))}
      <td className={`${CELL} max-sm:hidden`}>
        <Moment at={item.updatedAt} className="block truncate" />
        <span className="block truncate text-graphite" title={item.updatedBy.name}>
          {item.updatedBy.name}
        </span>
      </td>
    </tr>
  );
}

function SkeletonRow({ columns }: { columns: number }) {
  return (
    <tr className="border-b border-rule">
      <td className={CELL}>
        <Skeleton className="h-4 w-2/5" />
        <Skeleton className="mt-1 h-3 w-1/4" />
      </td>
      {Array.from({ length: columns }, (_, column) => (
        <td key={column} className={`${CELL} ${ROOMY}`}>
          <Skeleton className="h-3 w-4/5" />
        </td>
      ))}
      <td className={`${CELL} max-sm:hidden`}>
        <Skeleton className="h-3 w-4/5" />
      </td>
    </tr>
  );
}
