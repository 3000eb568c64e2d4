import { describe, expect, it } from 'vitest';
import { filterOf, type ListAddress, sortedBy } from '#client/sections/library/list-address.ts';
import { sectionListQuerySchema } from '#server/contracts/sections.ts';

const start: ListAddress = { sort: 'updated' };

describe('the address of the list', () => {
  it('asks for a column the way it is of use first, then the other way round', () => {
    expect(sortedBy(start, 'thickness')).toEqual({ sort: 'thickness', direction: undefined });
    expect(sortedBy({ sort: 'thickness' }, 'thickness')).toEqual({ direction: 'ascending' });
    expect(sortedBy({ sort: 'name' }, 'name')).toEqual({ direction: 'descending' });
    expect(sortedBy({ sort: 'name', direction: 'descending' }, 'name')).toEqual({ direction: 'ascending' });
  });

  it('makes a question that the contract accepts', () => {
    const filter = filterOf({ sort: 'camber', search: 'fin', status: 'draft', kind: 'cst' });
    expect(sectionListQuerySchema.parse(filter)).toEqual({ ...filter, limit: 50 });
    expect(filterOf(start)).toEqual({ sort: 'updated', direction: 'descending', limit: 50 });
  });
});
