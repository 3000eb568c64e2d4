import { formatLength, formatNumber, MM_PER_INCH, type Units } from '#client/app/units.ts';
import { type MachineSettings, type MaterialSettings } from '#server/contracts/shop.ts';
import { type ItemKind } from './form-values.ts';
import { formatShopQuantity } from './quantities.ts';

/** In the place of what a thing has not. */
export const NONE = '–';

export const KIND_WORDS: Readonly<Record<ItemKind, string>> = {
  wire: 'four-axis wire',
  bow: 'hand bow',
  laser: 'laser',
  router: 'router',
  foam: 'foam',
  sheet: 'sheet',
};

/** "600.0 × 60.0 × 1250.0 mm": the unit once, at the end. */
function product(lengths: readonly number[], units: Units): string {
  const texts = lengths.map((mm) =>
    units === 'mm' ? formatNumber(mm, 1) : formatNumber(mm / MM_PER_INCH, 2),
  );
  return `${texts.join(' × ')} ${units === 'mm' ? 'mm' : 'in'}`;
}

export function machineSize(settings: MachineSettings, units: Units): string {
  switch (settings.kind) {
    case 'wire':
      return `towers ${formatLength(settings.towerDistanceMm, units, 1)}, travel ${product([settings.travelXMm, settings.travelYMm], units)}`;
    case 'bow':
      return `wire ${formatLength(settings.wireLengthMm, units, 1)}, ⌀ ${formatLength(settings.wireDiameterMm, units)}`;
    case 'laser':
    case 'router':
      return `sheet ${product([settings.sheetWidthMm, settings.sheetHeightMm], units)}`;
  }
}

export function machineFeed(settings: MachineSettings, units: Units): string {
  return settings.kind === 'bow' ? 'by hand' : formatShopQuantity(settings.maxFeedMmMin, 'feed', units, 0);
}

export function materialSize(settings: MaterialSettings, units: Units): string {
  return settings.kind === 'foam'
    ? product([settings.blockLengthMm, settings.blockHeightMm, settings.blockSpanMm], units)
    : `${product([settings.sheetWidthMm, settings.sheetHeightMm], units)}, ${formatLength(settings.thicknessMm, units)} thick`;
}

export function materialDensity(settings: MaterialSettings, units: Units): string {
  return formatShopQuantity(settings.densityKgM3, 'density', units, 0);
}

export function materialFeed(settings: MaterialSettings, units: Units): string {
  return settings.kind === 'foam' ? formatShopQuantity(settings.maxFeedMmMin, 'feed', units, 0) : NONE;
}
