/** A starter as it is chosen from a list; its drawing is made where the sheet is. */
export type StarterTitle = { readonly id: string; readonly name: string; readonly about: string };

export const STARTER_TITLES = [
  {
    id: 'four-resistor-stage',
    name: 'Four-resistor biased stage',
    about: 'A common-source FET held by a gate divider and a source resistor.',
  },
  { id: 'source-follower', name: 'Source follower', about: 'A buffer on a mirrored sink, its body at ground.' },
  { id: 'mirror', name: 'Mirror', about: 'A reference current copied one to two.' },
  { id: 'cascode-mirror', name: 'Cascode mirror', about: 'A mirror of two FETs a side, for a stiffer copy.' },
  {
    id: 'self-biased-reference',
    name: 'Self-biased reference',
    about: 'A current set by one resistor, with the resistor that starts it.',
  },
  {
    id: 'differential-pair',
    name: 'Differential pair with mirror load',
    about: 'Two inputs, a mirrored tail and a P mirror as the load.',
  },
  {
    id: 'cascode-amplifier',
    name: 'Cascode amplifier',
    about: 'A common-source FET under a cascode, into a resistor.',
  },
  { id: 'inverter', name: 'CMOS inverter', about: 'Held at its switching threshold, both devices saturated.' },
  {
    id: 'output-driver',
    name: 'Discrete 12 V driver',
    about: 'A complementary output stage of discrete FETs given by k.',
  },
] as const satisfies readonly StarterTitle[];

export type StarterId = (typeof STARTER_TITLES)[number]['id'];
