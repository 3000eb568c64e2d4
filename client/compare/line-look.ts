/** How the outline and the deviation of a version are drawn, by its number in the list (line types of ISO 128-2). */
const DASHES: readonly (string | undefined)[] = [
  undefined,
  // Dashed (02).
  '8 3',
  // Long-dash-dot (04).
  '15 3 1.5 3',
  // Dotted (07).
  '1.5 3',
  // Long-dash double-dot (05).
  '15 3 1.5 3 1.5 3',
  // Dashed spaced (03).
  '8 9',
];

/** The dash pattern for a number from 1; the first is a continuous line. */
export function dashOf(tag: number): string | undefined {
  return DASHES[(tag - 1) % DASHES.length];
}

/**
 * Places moved apart so that two are at least `gap` from each other, as near to where they were wanted as that allows: those that
 * would lie on each other are centred about their middle. Within `from` … `to` as far as there is room.
 */
export function spread(wanted: readonly number[], gap: number, from: number, to: number): number[] {
  const order = wanted.map((place, index) => ({ place, index })).sort((a, b) => a.place - b.place);
  const groups: { count: number; sum: number; first: number }[] = [];
  order.forEach(({ place }) => {
    let group = { count: 1, sum: place, first: within(place, 1) };
    for (
      let before = groups.at(-1);
      before && before.first + before.count * gap > group.first;
      before = groups.at(-1)
    ) {
      groups.pop();
      const [count, sum] = [before.count + group.count, before.sum + group.sum];
      group = { count, sum, first: within(sum / count - ((count - 1) * gap) / 2, count) };
    }
    groups.push(group);
  });
  const places = groups.flatMap(({ count, first }) =>
    Array.from({ length: count }, (_, i) => first + i * gap),
  );
  const result = wanted.map(() => from);
  order.forEach(({ index }, i) => {
    result[index] = places[i] ?? from;
  });
  return result;

  /** The first place of a group that keeps it within the limits. */
  function within(first: number, count: number): number {
    return Math.max(from, Math.min(first, to - (count - 1) * gap));
  }
}
