/** What is printed where the work can hurt someone, in whole sentences. */
export const CAUTIONS = {
  print:
    'Print at 100 % (actual size, not fitted to the page). Measure both scale bars before you cut: 100 mm each, at most 0.2 mm off.',
  wire: 'Hot wire: it burns skin and can set foam alight. Gloves, an extinguisher at hand, and the wire off before you let go of it.',
  fumes:
    'Fumes: cut with extraction or in the open, with the lowest heat that cuts; never PVC or polyurethane foam.',
  machine:
    'Machine: check units and origin, run the program once with a cold wire, and keep the emergency stop in reach.',
  cutter:
    'Ribs: follow the safety rules of the laser or router; wear eye protection, and never leave a laser alone.',
  estimate:
    'Times, volumes and masses are estimates. Nothing here shows that a wing is strong enough or fit to fly: have a qualified person check it, and follow the aviation rules of your country.',
} as const;
