import { Button } from '#client/ui/button.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { type ListAddress, type Sort } from './list-address.ts';
import { SearchField } from '#client/ui/search-field.tsx';

const STATUSES = [
  { value: '', label: 'Any status' },
  { value: 'draft', label: 'Draft' },
  { value: 'released', label: 'Released' },
  { value: 'withdrawn', label: 'Withdrawn' },
  { value: 'archived', label: 'Archived' },
] as const;
const KINDS = [
  { value: '', label: 'Any kind' },
  { value: 'naca4', label: '4-digit' },
  { value: 'cst', label: 'Free form' },
] as const;
const SORTS: readonly { readonly value: Sort; readonly label: string }[] = [
  { value: 'updated', label: 'Last changed' },
  { value: 'name', label: 'Name' },
  { value: 'thickness', label: 'Thickness' },
  { value: 'camber', label: 'Camber' },
];

/** A table with heads to sort by, two-line rows, or the large rows of who sees what is released only. */
export type Layout = 'table' | 'list' | 'released';

interface ToolbarProps {
  address: ListAddress;
  onChange: (change: Partial<ListAddress>) => void;
  layout: Layout;
  onNew: (() => void) | undefined;
}

export function Toolbar({ address, onChange, layout, onNew }: ToolbarProps) {
  return (
    <div role="search" className="flex flex-wrap items-center gap-2 max-sm:grid max-sm:grid-cols-2">
      <SearchField
        label="Search name, purpose, designation"
        value={address.search ?? ''}
        onSearch={(search) => {
          onChange({ search });
        }}
        large={layout === 'released'}
        className={`max-sm:col-span-2 ${layout === 'released' ? 'sm:max-w-120' : 'sm:max-w-90'}`}
      />
      {layout !== 'released' && <Filters address={address} onChange={onChange} />}
      {layout !== 'table' && (
        <SelectField
          label="Order"
          hideLabel
          options={SORTS}
          value={address.sort}
          onChange={(event) => {
            onChange({ sort: event.target.value as Sort, direction: undefined });
          }}
          className={layout === 'released' ? 'max-sm:col-span-2 sm:w-48' : 'sm:w-40'}
          size={layout === 'released' ? 'large' : 'normal'}
        />
      )}
      {onNew && (
        <Button variant="primary" onClick={onNew} className="ml-auto max-sm:w-full">
          New section
        </Button>
      )}
    </div>
  );
}

function Filters({ address, onChange }: Pick<ToolbarProps, 'address' | 'onChange'>) {
  return (
    <>
      <SelectField
        label="Status"
        hideLabel
        options={STATUSES}
        value={address.status ?? ''}
        onChange={(event) => {
          onChange({ status: (event.target.value || undefined) as ListAddress['status'] });
        }}
        className="sm:w-36"
      />
      <SelectField
        label="Kind of shape"
        hideLabel
        options={KINDS}
        value={address.kind ?? ''}
        onChange={(event) => {
          onChange({ kind: (event.target.value || undefined) as ListAddress['kind'] });
        }}
        className="sm:w-36"
      />
    </>
  );
}
