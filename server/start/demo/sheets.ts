import { release, withdraw } from './histories.ts';
import { savePlan, type SheetHistory, takeSheetFile } from './sheet-histories.ts';
import { bittern, blockOf, firstSet, panel, rudder, trainer, winglet } from './sheet-plans.ts';

/** The cut sheets of the demo workshop with all that happened to them. */
export const demoSheets: readonly SheetHistory[] = [
  {
    name: 'Heron outer panel',
    purpose: 'Outer wing panel for the second Heron, left and right',
    steps: [
      savePlan(
        7,
        '09:30',
        'builder',
        { ...panel, features: panel.features.slice(0, 1) },
        'As the first set.',
      ),
      savePlan(6, '10:15', 'builder', panel, 'Slot for the carbon cap on top.'),
      release(6, '15:20', 'builder', 2, 'Test strip of yesterday: kerf as planned.'),
      takeSheetFile(5, '08:05', 'technician', 2, 'cut-sheet.pdf'),
      takeSheetFile(5, '08:10', 'technician', 2, 'core.nc'),
    ],
  },
  {
    name: 'Heron outer panel, first set',
    purpose: 'First Heron, kept for repairs',
    steps: [
      savePlan(21, '13:40', 'builder', firstSet, 'Spar tube only.'),
      release(20, '09:05', 'owner', 1, ''),
      takeSheetFile(20, '10:30', 'technician', 1, 'core.nc'),
    ],
  },
  {
    name: 'Heron winglet, by hand',
    purpose: 'Cut by two people with the bow',
    steps: [
      savePlan(15, '11:20', 'builder', winglet, 'Ramps long enough for both thumbs.'),
      release(14, '08:40', 'builder', 1, 'Templates tried on a scrap block.'),
      takeSheetFile(13, '09:00', 'technician', 1, 'templates.pdf'),
    ],
  },
  {
    name: 'Curlew trainer ribs',
    purpose: 'Nine ribs for each half, sheeted with 1 mm',
    steps: [
      savePlan(11, '10:45', 'designer', trainer, 'Caps of 5 mm spruce, as on the first one.'),
      release(10, '16:30', 'owner', 1, ''),
      takeSheetFile(9, '08:20', 'technician', 1, 'ribs-1.dxf'),
    ],
  },
  {
    name: 'Sedge rudder core',
    purpose: 'Rudder of the first Sedge',
    steps: [
      savePlan(25, '15:10', 'builder', rudder, ''),
      release(24, '11:00', 'builder', 1, ''),
      takeSheetFile(24, '13:20', 'technician', 1, 'core.nc'),
      withdraw(12, '17:20', 'owner', 1, 'The section was withdrawn: its edge tears.'),
    ],
  },
  {
    name: 'Bittern wing',
    purpose: 'Flying wing, left and right half',
    steps: [
      savePlan(3, '16:05', 'builder', bittern, 'First try: needs a higher block.'),
      {
        did: 'keep draft',
        at: { daysAgo: 1, time: '15:30' },
        by: 'builder',
        plan: { ...bittern, block: blockOf(460, 60, 750) },
      },
    ],
  },
];
