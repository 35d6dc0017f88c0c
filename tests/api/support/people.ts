/** The people of the demo scenario by first name. */
export const PEOPLE = {
  mira: 'mira@tarnholm.example',
  tomas: 'tomas@tarnholm.example',
  ines: 'ines@tarnholm.example',
  kofi: 'kofi@tarnholm.example',
  runa: 'runa@kestrel.example',
  edda: 'edda@kestrel.example',
} as const
