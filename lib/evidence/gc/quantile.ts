/**
 * Value at a quantile (0..1) of a scratch array, by selection: the array is reordered.
 * No interpolation, so the answer is one of the values. Empty: NaN.
 */
export function quantileInPlace(values: Float64Array, fraction: number, count = values.length): number {
  if (count === 0) return Number.NaN;
  const wanted = Math.min(count - 1, Math.max(0, Math.floor(fraction * count)));
  let low = 0;
  let high = count - 1;
  while (low < high) {
    const pivot = values[(low + high) >> 1]!;
    let i = low;
    let j = high;
    while (i <= j) {
      while (values[i]! < pivot) i++;
      while (values[j]! > pivot) j--;
      if (i <= j) {
        const swapped = values[i]!;
        values[i] = values[j]!;
        values[j] = swapped;
        i++;
        j--;
      }
    }
    if (wanted <= j) high = j;
    else if (wanted >= i) low = i;
    else break;
  }
  return values[wanted]!;
}
