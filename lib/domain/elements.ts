/** What a placement pours. */
export const ELEMENTS = [
  'slab',
  'footing',
  'wall',
  'pier',
  'column',
  'steps',
  'curb',
  'deck',
  'other',
] as const;
