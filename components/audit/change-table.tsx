type Side = Record<string, unknown> | null;

function asRecord(value: unknown): Side {
  return value !== null && typeof value === 'object' && !Array.isArray(value)
    ? (value as Record<string, unknown>)
    : null;
}

function inWords(value: unknown): string {
  if (value === undefined || value === null) return 'nothing';
  return typeof value === 'object' ? JSON.stringify(value) : String(value);
}

/** What was there before beside what is there after, field by field. */
export function ChangeTable({ before, after }: { before: unknown; after: unknown }) {
  const [left, right] = [asRecord(before), asRecord(after)];
  const fields = [...new Set([...Object.keys(left ?? {}), ...Object.keys(right ?? {})])];
  if (fields.length === 0)
    return <p className="text-sm text-ink-soft">The event says it all; no field was kept with it.</p>;
  return (
    <table className="text-sm">
      <thead>
        <tr className="text-left">
          <th className="pr-6">Field</th>
          <th className="pr-6">Before</th>
          <th>After</th>
        </tr>
      </thead>
      <tbody>
        {fields.map((field) => (
          <tr key={field} className="align-top">
            <th scope="row" className="pr-6 text-left font-normal">
              {field}
            </th>
            <td className="pr-6 break-words">{left ? inWords(left[field]) : ''}</td>
            <td className="break-words">{right ? inWords(right[field]) : ''}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
