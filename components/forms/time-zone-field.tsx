'use client';

import type { ComponentProps } from 'react';
import { useSyncExternalStore } from 'react';
import { SelectField } from '../ui/field';

/** The zones of the trade's home market by the names people use; all others follow. */
const NEAR: readonly (readonly [zone: string, name: string])[] = [
  ['America/New_York', 'Eastern (New York)'],
  ['America/Chicago', 'Central (Chicago)'],
  ['America/Denver', 'Mountain (Denver)'],
  ['America/Phoenix', 'Arizona (Phoenix)'],
  ['America/Los_Angeles', 'Pacific (Los Angeles)'],
  ['America/Anchorage', 'Alaska (Anchorage)'],
  ['Pacific/Honolulu', 'Hawaii (Honolulu)'],
];
const NEAR_ZONES = new Set(NEAR.map(([zone]) => zone));

const nothing: readonly string[] = [];
let everyZone: readonly string[] | null = null;

/** The browser's own list, read once; the server's may differ, so it renders without. */
function zonesHere(): readonly string[] {
  everyZone ??= Intl.supportedValuesOf('timeZone').filter((zone) => !NEAR_ZONES.has(zone));
  return everyZone;
}

interface TimeZoneFieldProps extends ComponentProps<typeof SelectField> {
  /** The zone already chosen, offered even where this browser does not know it. */
  current?: string;
}

export function TimeZoneField({ current, ...field }: TimeZoneFieldProps) {
  const far = useSyncExternalStore(
    () => () => {},
    zonesHere,
    () => nothing,
  );
  const missing = current && !NEAR_ZONES.has(current) && !far.includes(current);
  return (
    <SelectField {...field}>
      {missing && <option value={current}>{current}</option>}
      <optgroup label="United States">
        {NEAR.map(([zone, name]) => (
          <option key={zone} value={zone}>
            {name}
          </option>
        ))}
      </optgroup>
      <optgroup label="…">
        {far.map((zone) => (
          <option key={zone} value={zone}>
            {zone.replaceAll('_', ' ')}
          </option>
        ))}
      </optgroup>
    </SelectField>
  );
}
