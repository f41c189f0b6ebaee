export const lightNotes = {
  scenes_are_settings: () =>
    'The list says how whole scenes are usually set on a camera. It is no table of illuminance, and it does not replace a meter.',
  scenes_in_direct_sun: () =>
    'What lies in direct sun holds from about two hours after sunrise to two hours before sunset, with the light from the front; take 1 off for light from the side, 2 for light from behind.',
  ratio_counts_both: () =>
    'The ratio is (key + fill):fill, as the light falls on the face. Who counts key to fill by strength alone says one less, 2:1 for what is 3:1 here.',
  fill_outshines_key: () =>
    'The fill is the stronger of the two, so it is the one that models the face; check which lamp is which.',
  ripple_worst_case: () =>
    'The lamp is taken to go dark between its pulses, the worst case. Give rippleDepth where you know it: filaments ripple little, most lamps with a good driver hardly at all.',
  ripple_of_mains_only: () =>
    'This is the ripple of the mains. Lamps that a dimmer or a driver switches at a frequency of its own band differently: give half of that frequency as mainsHz, or try it out.',
  ripple_under_one_cycle: () =>
    'The exposure is shorter than one cycle of the ripple, so every frame catches another part of it.',
} as const;
