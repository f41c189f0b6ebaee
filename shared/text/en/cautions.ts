/** Cautions, in our own sentences; code and text go out with answers and stand in the console. */
export const cautions = {
  sun_and_optics:
    'Never look at the sun through an optical viewfinder or a long lens, also while waiting for it to set. Use the rear screen, and don’t leave a lens pointed at the sun.',
  flash_and_eyes:
    'Keep flash away from eyes at close range. Ask before you flash people, some of whom have photosensitive epilepsy, and never flash towards drivers or animals.',
  stands_and_wind:
    'Weight every stand against the wind, lower it when gusts come, and keep it off paths and edges.',
  electricity_and_water:
    'Battery packs and mains heads near water, rain or dew: follow the maker’s instructions and use residual-current protection.',
  night_and_place:
    'Working at night near roads, water, rails or roofs: be seen, have a second person with you, and look at the way out while there is light.',
  permits:
    'Permits and local rules for tripods, stands, lights and public places apply; ask before you set up.',
  arithmetic_only:
    'This is arithmetic, not a safety assessment; the maker’s manual, local codes and qualified people decide.',
} as const;
