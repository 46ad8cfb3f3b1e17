/** Index of the mark that a key leads to; -1 when the key leads nowhere. */
export function nextMark(key: string, current: number, count: number): number {
  if (current < 0 || count === 0) return -1;
  switch (key) {
    case 'ArrowRight':
    case 'ArrowDown':
      return Math.min(count - 1, current + 1);
    case 'ArrowLeft':
    case 'ArrowUp':
      return Math.max(0, current - 1);
    case 'Home':
      return 0;
    case 'End':
      return count - 1;
    default:
      return -1;
  }
}
