/** Finds things by their code: letter by letter, else without regard to capitals where that leaves one only. */
export class CodeIndex<T> {
  private readonly exact = new Map<string, T>();
  private readonly folded = new Map<string, T | null>();

  add(code: string, value: T): void {
    this.exact.set(code, value);
    const key = fold(code);
    this.folded.set(key, this.folded.has(key) ? null : value);
  }

  find(text: string): T | undefined {
    return this.exact.get(text) ?? this.folded.get(fold(text)) ?? undefined;
  }

  codes(): string[] {
    return [...this.exact.keys()];
  }
}

/** Capitals and the width of spaces do not tell codes and names apart. */
export function fold(text: string): string {
  return text.normalize('NFC').toLowerCase().replace(/\s+/g, ' ');
}
