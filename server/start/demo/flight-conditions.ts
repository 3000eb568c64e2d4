import { fastDash, levelTrainer, slowLoiter } from '#server/contracts/flight-condition-samples.ts';
import { type ConditionInput } from '#server/contracts/flight-conditions.ts';

/** The flight conditions of the demo workshop, all invented; the first is the default. */
export const demoConditions: readonly ConditionInput[] = [
  { name: 'Survey, level at 17 m/s', settings: levelTrainer },
  { name: 'Loiter, warm day at 1200 m', settings: slowLoiter },
  { name: 'Courier, fast leg', settings: fastDash },
];
