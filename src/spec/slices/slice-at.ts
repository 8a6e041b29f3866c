/** Finds the slice that an offset of the file lies in. */

/** The last slice that starts at or before the offset; null before the first. Slices are in the order of the text. */
export function sliceAt<P extends { readonly slice: { readonly start: number } }>(
  slices: readonly P[],
  offset: number,
): P | null {
  let low = 0;
  let high = slices.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((slices[middle]?.slice.start ?? Infinity) <= offset) low = middle + 1;
    else high = middle;
  }
  return slices[low - 1] ?? null;
}
