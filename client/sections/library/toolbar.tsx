import { Button } from '#client/ui/button.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { type ListAddress, type Sort } from './list-address.ts';
import { SearchField } from './search-field.tsx';

const STATUSES = [
  { value: '', label: 'Any status' },
  { value: 'draft', label: 'Draft' },
  { value: 'released', label: 'Released' },
  { value: 'withdrawn', label: 'Withdrawn' },
  { value: 'archived', label: 'Archived' },
] as const;
const KINDS = [
  { value: '', label: '4-digit and free-form' },
  { value: 'naca4', label: '4-digit' },
  { value: 'cst', label: 'Free-form' },
] as const;
const SORTS: readonly { readonly value: Sort; readonly label: string }[] = [
  { value: 'updated', label: 'Last changed' },
  { value: 'name', label: 'Name' },
  { value: 'thickness', label: 'Thickness' },
  { value: 'camber', label: 'Camber' },
];

export interface ToolbarProps {
  address: ListAddress;
  onChange: (change: Partial<ListAddress>) => void;
  /** Offers the filter by status: for readers who see more than what is released. */
  withStatus: boolean;
  /** Offers the order as a field: where there are no column heads to press. */
  withSort: boolean;
  onNew: (() => void) | undefined;
}

export function Toolbar({ address, onChange, withStatus, withSort, onNew }: ToolbarProps) {
  return (
    <search className="flex flex-wrap items-center gap-2">
      <SearchField
        label="Search name, purpose, designation"
        value={address.search ?? ''}
        onSearch={(search) => {
          onChange({ search });
        }}
        className="max-w-90 min-w-0 flex-[1_1_16rem] max-sm:max-w-none"
      />
      {withStatus && (
        <SelectField
          label="Status"
          hideLabel
          options={STATUSES}
          value={address.status ?? ''}
          onChange={(event) => {
            onChange({ status: (event.target.value || undefined) as ListAddress['status'] });
          }}
          className="w-36 max-sm:flex-1"
        />
      )}
      <SelectField
        label="Kind of shape"
        hideLabel
        options={KINDS}
        value={address.kind ?? ''}
        onChange={(event) => {
          onChange({ kind: (event.target.value || undefined) as ListAddress['kind'] });
        }}
        className="w-52 max-sm:w-36 max-sm:flex-1"
      />
      {withSort && (
        <SelectField
          label="Order"
          hideLabel
          options={SORTS}
          value={address.sort}
          onChange={(event) => {
            onChange({ sort: event.target.value as Sort, direction: undefined });
          }}
          className="w-36 max-sm:flex-1"
        />
      )}
      {onNew && (
        <Button variant="primary" onClick={onNew} className="ml-auto max-sm:w-full">
          New section
        </Button>
      )}
    </search>
  );
}
