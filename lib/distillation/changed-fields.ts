type Fields = Record<string, unknown>;

function comparable(value: unknown): unknown {
  return value instanceof Date ? value.getTime() : JSON.stringify(value ?? null);
}

/** Of the wanted fields only those that differ from what is there: an audit event tells what changed. */
export function changedFields(present: Fields, wanted: Fields): { before: Fields; after: Fields } {
  const before: Fields = {};
  const after: Fields = {};
  for (const [name, value] of Object.entries(wanted)) {
    if (value === undefined || comparable(present[name]) === comparable(value)) continue;
    before[name] = present[name] ?? null;
    after[name] = value;
  }
  return { before, after };
}
