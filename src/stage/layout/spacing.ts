/** Room between things, grid units: a chip is about five by two, its leader two, a badge with its words eleven by four. */
export const spacing = {
  /** From a rail or ground, or a trunk at their level, to the pin that hangs on it. */
  power: 2,
  /** From a pin down to the level of its net, where a chevron stands in the lead. */
  belowPin: 3,
  /** From the level of a net down to the next pin. */
  abovePin: 2,
  /** The same above a transistor, whose badge stands high beside it. */
  aboveStack: 3,
  /** Pins of an upright part lie this far above and below its middle. */
  half: 3,
  /** Right of the axis of an upright part, for its name and value. */
  lettering: 6,
  /** Beside a transistor, on the side away from its gate, for the badge, the region's word and the current. */
  badge: 15,
  /** Between what stands side by side: a chip finds room here. */
  beside: 4,
  /** Between groups that no wire joins. */
  groups: 8,
} as const;
