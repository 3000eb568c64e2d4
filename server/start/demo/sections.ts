import { type History, release, save, takeFile, withdraw } from './histories.ts';
import { fourDigit, freeForms as forms } from './shapes.ts';

const heron: readonly History[] = [
  {
    name: 'Heron outer panel',
    purpose: 'Outer wing panel, 220 mm chord at the joint, washout 2°',
    steps: [
      save(38, '09:12', 'designer', fourDigit(2, 40, 14), 'First from the sizing sheet.'),
      release(36, '14:40', 'owner', 1, 'For the first test panel.'),
      takeFile(35, '08:20', 'technician', 1, 'dxf', { chordMm: 220 }),
      save(24, '10:05', 'designer', fourDigit(2, 40, 12.8), 'Thinner: less drag at cruise.'),
      release(22, '16:10', 'designer', 2, ''),
      takeFile(21, '07:55', 'technician', 2, 'dxf', { chordMm: 220 }),
      save(
        9,
        '08:48',
        'designer',
        fourDigit(2, 40, 12),
        'Spar cap of 24 mm still clears; whole digits again.',
      ),
      release(8, '11:30', 'owner', 3, 'Test panel cut and measured, within 0.2 mm.'),
      takeFile(8, '13:05', 'builder', 3, 'svg', { chordMm: 220 }),
      takeFile(7, '08:10', 'technician', 3, 'dxf', { chordMm: 220 }),
      takeFile(3, '08:05', 'technician', 3, 'dxf', { chordMm: 180 }),
      save(2, '15:22', 'designer', fourDigit(2.3, 42, 12), 'Trial: a little more camber, crest further aft.'),
      {
        did: 'keep draft',
        at: { daysAgo: 1, time: '16:45' },
        by: 'designer',
        shape: fourDigit(2.3, 44, 11.6),
        chordMm: 220,
      },
    ],
  },
  {
    name: 'Heron inner panel',
    purpose: 'Inner wing panel, 260 mm chord, carries the joiner',
    steps: [
      save(37, '13:20', 'designer', fourDigit(2, 40, 15), 'Same family as the outer panel, joiner at 30 %.'),
      release(36, '14:55', 'owner', 1, 'For the first test panel.'),
      save(21, '09:40', 'designer', fourDigit(2.4, 40, 15), 'More camber at the root, less washout needed.'),
      save(
        20,
        '11:15',
        'designer',
        fourDigit(2.4, 40, 14.4),
        'Joiner box is 36 mm high: 14.4 % leaves 0.7 mm a side.',
      ),
      release(19, '10:30', 'designer', 3, 'Joiner box tried in a foam sample.'),
      takeFile(18, '08:30', 'technician', 3, 'dxf', { chordMm: 260 }),
      takeFile(7, '08:12', 'technician', 3, 'dxf', { chordMm: 260 }),
    ],
  },
  {
    name: 'Heron winglet',
    purpose: 'Winglet, 140 mm chord at its root',
    steps: [
      save(33, '15:05', 'designer', fourDigit(1, 40, 9), 'Little camber, turned inwards.'),
      save(18, '09:25', 'designer', fourDigit(1, 40, 10), 'One per cent thicker: the tip broke in handling.'),
      release(17, '13:50', 'designer', 2, ''),
      takeFile(16, '10:15', 'builder', 2, 'svg', { chordMm: 140 }),
      takeFile(15, '09:20', 'technician', 2, 'dat', { chordMm: 140 }),
    ],
  },
];

const tails: readonly History[] = [
  {
    name: 'Tail fin core',
    purpose: 'Fin and rudder from one core, 180 mm chord',
    steps: [
      save(35, '10:10', 'designer', fourDigit(0, 0, 8, 'closed'), 'Plain symmetrical section to begin with.'),
      release(34, '09:30', 'owner', 1, ''),
      save(27, '14:35', 'designer', fourDigit(0, 0, 9), 'Open edge: the closed one burned away.'),
      release(26, '08:50', 'designer', 2, 'Cut twice without loss at the edge.'),
      save(12, '16:20', 'designer', forms.fin, 'Free form: fuller behind the hinge line.'),
      save(
        11,
        '10:55',
        'designer',
        forms.finThicker,
        'Edge of 0.9 mm at 180 mm chord, stiff enough for the hinge.',
      ),
      release(6, '12:05', 'owner', 4, 'Fin flown on the test rig.'),
      takeFile(5, '08:25', 'technician', 4, 'dxf', { chordMm: 180, arcs: true }),
    ],
  },
  {
    name: 'Reed tailplane',
    purpose: 'All-moving tailplane, pivot at 25 %',
    steps: [
      save(30, '11:45', 'designer', forms.thinTailFirst, 'As thin as the 8 mm pivot tube allows.'),
      save(25, '13:15', 'designer', forms.thinTail, 'A little more foam over the tube.'),
      release(23, '09:05', 'designer', 2, 'Pivot tube fits with 1 mm of foam around it.'),
      takeFile(22, '10:40', 'technician', 2, 'dxf', { chordMm: 150 }),
    ],
  },
  {
    name: 'Sedge rudder',
    purpose: 'Separate rudder, 90 mm chord',
    steps: [
      save(29, '11:10', 'designer', fourDigit(0, 0, 8), 'First guess, from the old fin.'),
      save(28, '15:40', 'designer', fourDigit(0, 0, 6), 'Thin, to match the old fin.'),
      release(26, '09:15', 'owner', 2, ''),
      takeFile(25, '08:45', 'technician', 2, 'dxf', { chordMm: 90 }),
      withdraw(
        12,
        '17:00',
        'owner',
        2,
        'Edge is thinner than the hinge stock and tears. Use the tail fin core.',
      ),
    ],
  },
];

const wings: readonly History[] = [
  {
    name: 'Marsh 2412',
    purpose: 'Survey wing, constant chord, cut as one panel',
    steps: [
      save(29, '10:30', 'owner', fourDigit(2, 40, 12, 'closed'), 'Known section, for comparison.'),
      save(
        16,
        '14:10',
        'designer',
        fourDigit(2, 40, 12),
        'Open edge as published: room for the glass cloth.',
      ),
      release(15, '09:45', 'designer', 2, 'Skin of 0.2 mm closes the edge.'),
      takeFile(14, '08:15', 'technician', 2, 'dxf', { chordMm: 200 }),
      takeFile(6, '09:30', 'builder', 2, 'dat', { chordMm: 200 }),
    ],
  },
  {
    name: 'Curlew trainer wing',
    purpose: 'Trainer, flat underside to build on the bench',
    steps: [
      save(32, '09:55', 'designer', forms.flatBottomFirst, 'Underside straight from 20 % chord aft.'),
      release(31, '15:30', 'owner', 1, ''),
      save(
        14,
        '11:05',
        'designer',
        forms.flatBottom,
        'Fuller over the nose for a softer stall, edge of 1.5 mm at 250 mm.',
      ),
      release(13, '16:15', 'owner', 2, 'Students flew it; lands slower than the first.'),
      takeFile(12, '08:00', 'technician', 2, 'dxf', { chordMm: 250, release: 'r12' }),
    ],
  },
  {
    name: 'Bittern wing root',
    purpose: 'Flying wing, root, 300 mm chord',
    steps: [
      save(34, '16:50', 'designer', forms.reflexFirst, 'Gentle reflex; rear line lifts from 80 %.'),
      release(31, '10:20', 'designer', 1, 'For the glide model.'),
      save(19, '15:00', 'designer', forms.reflex, 'More reflex: the model needed 3° of up trim.'),
      release(18, '10:40', 'owner', 2, 'Glides hands off.'),
      takeFile(17, '08:35', 'technician', 2, 'dxf', { chordMm: 300 }),
      save(5, '13:35', 'designer', forms.reflexTrial, 'Trial with the battery 10 mm further forward.'),
    ],
  },
  {
    name: 'Bittern wing tip',
    purpose: 'Flying wing, tip, 170 mm chord, washout 3°',
    steps: [
      save(
        10,
        '14:25',
        'designer',
        forms.reflexTip,
        'The root section at about three quarters of its thickness.',
      ),
      save(4, '10:15', 'designer', forms.reflexTipTrial, 'Blunter nose and less reflex, against tip stall.'),
    ],
  },
  {
    name: 'Teal slow-flight wing',
    purpose: 'Load carrier, 14 m/s with 2 kg aboard',
    steps: [
      save(7, '09:35', 'designer', forms.highLiftFirst, 'Camber moved aft for lift at low speed.'),
      save(3, '14:50', 'designer', forms.highLift, 'More still; check whether the edge can be cut.'),
    ],
  },
  {
    name: 'Crane centre section',
    purpose: 'Centre section around the 40 mm spar tube',
    steps: [
      save(33, '08:40', 'designer', fourDigit(2, 40, 18), 'First guess: 3 mm of foam around the tube.'),
      release(30, '11:50', 'owner', 1, ''),
      save(
        20,
        '16:30',
        'designer',
        forms.thickRoot,
        'Free form, 20 %: 6 mm around the tube at 260 mm chord.',
      ),
      release(18, '14:15', 'owner', 2, 'Tube glued in, no marks through the skin.'),
      takeFile(16, '11:10', 'builder', 2, 'dxf', { chordMm: 260 }),
      save(1, '11:20', 'owner', forms.thickRootBlunter, 'Deeper at the nose for the cable duct.'),
    ],
  },
];

const put: readonly History[] = [
  {
    name: 'Bench test wing',
    purpose: 'Strength tests only',
    steps: [
      save(39, '14:30', 'owner', fourDigit(4, 40, 10), 'Thickness of the old wing.'),
      save(38, '16:00', 'owner', fourDigit(4, 40, 12), 'For the sandbag test.'),
      release(37, '09:00', 'owner', 2, 'Not for flight.'),
      { did: 'archive', at: { daysAgo: 16, time: '17:30' }, by: 'owner' },
    ],
  },
];

/** The sections of the demo workshop with all that happened to them. */
export const demoSections: readonly History[] = [...heron, ...tails, ...wings, ...put];
