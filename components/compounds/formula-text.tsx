/** A molecular formula with its numbers set low; a screen reader gets it as plain text. */
export function FormulaText({ formula }: { formula: string }) {
  return (
    <span className="whitespace-nowrap">
      <span className="sr-only">{formula}</span>
      <span aria-hidden="true">
        {formula
          .split(/(\d+)/)
          .map((part, at) => (/^\d/.test(part) ? <sub key={at}>{part}</sub> : <span key={at}>{part}</span>))}
      </span>
    </span>
  );
}
