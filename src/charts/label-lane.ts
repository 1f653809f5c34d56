/** Of centred labels on one line those that don't touch, earlier ones winning. */
export function labelsThatFit<Label extends { x: number; width: number }>(
  labels: readonly Label[],
  gap: number,
): Label[] {
  const placed: Label[] = [];
  for (const label of labels) {
    const free = placed.every(
      (other) => Math.abs(other.x - label.x) >= (other.width + label.width) / 2 + gap,
    );
    if (free) placed.push(label);
  }
  return placed;
}
