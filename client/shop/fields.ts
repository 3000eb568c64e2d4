import { type MachineKind, type MaterialKind } from '#server/contracts/shop.ts';
import { type ShopQuantity } from './quantities.ts';

export interface Option {
  readonly value: string;
  readonly label: string;
}
/** One setting as a field: where it stands in the settings, and how it is typed. */
export type FieldSpec = {
  /** Path in the settings, in dots. */
  readonly path: string;
  readonly label: string;
  readonly hint?: string;
} & (
  | { readonly as: ShopQuantity; readonly decimals: number }
  | { readonly as: 'whole' }
  | { readonly as: 'choice'; readonly options: readonly Option[] }
  | { readonly as: 'yes-no' }
  | { readonly as: 'lines' }
);
export interface FieldGroup {
  readonly title: string;
  readonly fields: readonly FieldSpec[];
}

const length = (path: string, label: string, decimals = 1): FieldSpec => ({
  path,
  label,
  as: 'length',
  decimals,
});
const feed = (path: string, label: string): FieldSpec => ({ path, label, as: 'feed', decimals: 0 });
const choice = (path: string, label: string, labels: Readonly<Record<string, string>>): FieldSpec => ({
  path,
  label,
  as: 'choice',
  options: Object.entries(labels).map(([value, text]) => ({ value, label: text })),
});

const LETTERS = Object.fromEntries([...'XYZUVWABC'].map((letter) => [letter, letter]));

const wire: readonly FieldGroup[] = [
  {
    title: 'Size and travel',
    fields: [
      length('towerDistanceMm', 'Between the towers'),
      length('travelXMm', 'Travel along the chord'),
      length('travelYMm', 'Travel in height'),
    ],
  },
  {
    title: 'Feed',
    fields: [feed('maxFeedMmMin', 'Largest feed'), feed('travelFeedMmMin', 'Feed outside the foam')],
  },
  {
    title: 'Block on the machine',
    fields: [
      length('blockXMm', 'Near edge at'),
      length('blockYMm', 'Underside at'),
      length('blockFromLeftMm', 'From the left tower'),
      choice('rootFace', 'Root towards', { left: 'left tower', right: 'right tower' }),
      choice('trailingEdge', 'Trailing edge towards', { origin: 'the origin', far: 'the far end' }),
    ],
  },
  {
    title: 'Controller',
    fields: [
      choice('controller.axes.leftX', 'Left tower, chord', LETTERS),
      choice('controller.axes.leftY', 'Left tower, height', LETTERS),
      choice('controller.axes.rightX', 'Right tower, chord', LETTERS),
      choice('controller.axes.rightY', 'Right tower, height', LETTERS),
      choice('controller.timeMode', 'Feed given as', {
        'inverse-time': 'G93, time of each move',
        'feed-per-minute': 'G94, per minute',
      }),
      choice('controller.inverseTime', 'F under G93', {
        'per-minute': '1/min',
        'per-second': '1/s',
        seconds: 'seconds',
      }),
      choice('controller.feedOver', 'F under G94 over', {
        'left-tower': 'left tower',
        'all-axes': 'all four axes',
      }),
      { path: 'controller.decimals', label: 'Decimals', as: 'whole' },
      { path: 'controller.lineNumbers', label: 'Line numbers', as: 'yes-no' },
      choice('controller.dwellUnit', 'Dwell in', { seconds: 'seconds', milliseconds: 'milliseconds' }),
      {
        path: 'controller.header',
        label: 'Lines at the start',
        hint: 'Words such as M3 S500, or a comment in brackets.',
        as: 'lines',
      },
      { path: 'controller.footer', label: 'Lines at the end', as: 'lines' },
    ],
  },
];

const bow: readonly FieldGroup[] = [
  {
    title: 'Wire',
    fields: [length('wireLengthMm', 'Free wire'), length('wireDiameterMm', 'Diameter', 2)],
  },
];

const bed: readonly FieldGroup[] = [
  {
    title: 'Sheet and travel',
    fields: [
      length('sheetWidthMm', 'Sheet width'),
      length('sheetHeightMm', 'Sheet height'),
      length('travelXMm', 'Travel in X'),
      length('travelYMm', 'Travel in Y'),
    ],
  },
  { title: 'Feed', fields: [feed('maxFeedMmMin', 'Largest feed')] },
];

const density: FieldSpec = { path: 'densityKgM3', label: 'Density', as: 'density', decimals: 0 };

const foam: readonly FieldGroup[] = [
  { title: 'Foam', fields: [density] },
  {
    title: 'Block as it comes',
    fields: [
      length('blockLengthMm', 'Along the chord'),
      length('blockHeightMm', 'Height'),
      length('blockSpanMm', 'Along the span'),
    ],
  },
  {
    title: 'Wire speed in the foam',
    fields: [feed('feedMmMin', 'Wanted'), feed('maxFeedMmMin', 'Limit')],
  },
];

const sheet: readonly FieldGroup[] = [
  {
    title: 'Sheet as it comes',
    fields: [
      length('thicknessMm', 'Thickness', 2),
      density,
      length('sheetWidthMm', 'Width'),
      length('sheetHeightMm', 'Height'),
    ],
  },
];

/** The fields of every kind of machine and material, in the order of the form. */
export const FIELDS: Readonly<Record<MachineKind | MaterialKind, readonly FieldGroup[]>> = {
  wire,
  bow,
  laser: bed,
  router: bed,
  foam,
  sheet,
};
