/** Units as bills print them, brought to one word each. */
const UNITS: Readonly<Record<string, readonly string[]>> = {
  yd: [
    'yd',
    'yds',
    'cy',
    'cuyd',
    'cuyds',
    'cyd',
    'cyds',
    'yard',
    'yards',
    'yd3',
    'cubicyards',
    'y',
  ],
  load: ['ld', 'lds', 'load', 'loads', 'trip', 'trips'],
  each: ['ea', 'each', 'pc', 'pcs', 'unit', 'lot', 'ls'],
  hour: ['hr', 'hrs', 'hour', 'hours', 'h'],
  minute: ['mn', 'min', 'mins', 'minute', 'minutes'],
  bag: ['bag', 'bags', 'bg'],
  pound: ['lb', 'lbs', 'pound', 'pounds'],
  ounce: ['oz', 'ounce', 'ounces'],
  ton: ['tn', 'ton', 'tons', 'tns'],
  foot: ['ft', 'lf', 'foot', 'feet'],
  gallon: ['gal', 'gals', 'gl', 'gallon', 'gallons'],
  mile: ['mi', 'mile', 'miles'],
};

const BY_SPELLING = new Map<string, string>(
  Object.entries(UNITS).flatMap(([unit, spellings]) =>
    spellings.map((spelling): [string, string] => [spelling, unit]),
  ),
);

/** "CY" → "yd", "Hrs." → "hour"; null for words that are no unit that we know. */
export function knownUnit(text: string | null): string | null {
  if (text === null) return null;
  const bare = text
    .toLowerCase()
    .replace(/³/g, '3')
    .replace(/[^a-z0-9]/g, '');
  return BY_SPELLING.get(bare) ?? null;
}
