/** What the groups of calculators are about. */
const GROUPS: Readonly<Record<string, { title: string; about: string }>> = {
  exposure: { title: 'Exposure', about: 'Aperture, shutter and ISO, and what they do to one another.' },
  light: { title: 'Light', about: 'How much there is, in which unit, and how lights add up.' },
  filters: { title: 'Filters and gels', about: 'Light taken away, and light turned warmer or cooler.' },
  flash: { title: 'Flash', about: 'Reach, duration, motion, and flash against daylight.' },
  twilight: { title: 'Twilight', about: 'Where the sun is, when it goes, and how fast the light falls.' },
  fill: {
    title: 'Fill',
    about: 'Settings and flash powers that put subject and background where they belong.',
  },
  frames: { title: 'Frames', about: 'What a test frame says about the light.' },
};

/** A group's title and its sentence; a group without an entry goes by its name. */
export function calculatorGroup(group: string): { title: string; about: string } {
  return GROUPS[group] ?? { title: group.charAt(0).toUpperCase() + group.slice(1), about: '' };
}
