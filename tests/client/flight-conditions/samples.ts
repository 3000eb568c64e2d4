import { idOf } from '#tests/client/support/samples.ts';
import { fastDash, levelTrainer } from '#server/contracts/flight-condition-samples.ts';
import { type StoredCondition } from '#server/contracts/flight-conditions.ts';

const common = {
  archived: false,
  isDefault: false,
  revision: 1,
  createdAt: '2024-03-01T10:00:00.000Z',
  updatedAt: '2024-03-02T10:00:00.000Z',
  updatedBy: { id: idOf(1), name: 'Tobin Sedgley' },
};

export const survey: StoredCondition = {
  ...common,
  id: idOf(31),
  name: 'Survey',
  settings: levelTrainer,
  isDefault: true,
};
export const courier: StoredCondition = { ...common, id: idOf(32), name: 'Courier', settings: fastDash };
export const old: StoredCondition = { ...courier, id: idOf(33), name: 'Old', archived: true };
