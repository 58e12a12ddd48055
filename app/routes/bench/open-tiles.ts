const FIELDS: Record<string, string[]> = {
  rest: ['draft.rest.product', 'draft.rest.clampsOffHours', 'draft.rest.workedHours'],
  material: ['used'],
  climate: ['draft.temperature', 'draft.humidity'],
  hours: ['draft.minutes'],
  bench: ['draft.benchNote'],
  when: ['draft.occurredClock'],
};

/** The tiles of an entry's form that have something in them, so that nothing typed is out of sight. */
export function openTiles(values: Record<string, string>): string[] {
  return Object.entries(FIELDS).flatMap(([tile, names]) =>
    names.some((name) => (values[name] ?? '') !== '') ? [tile] : [],
  );
}
