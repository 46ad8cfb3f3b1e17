import { describe, expect, it } from 'vitest';
import { decisionAgreement } from '@/lib/stats';
import file from './facts.json';

/** Limits of others are not computed; they serve as data of a decision. The rules that apply are the local ones. */
describe('published action levels as limits of a decision', () => {
  it.each(file.checks)('published: $id is $value', ({ value: limit, source, provenance }) => {
    expect(source).toMatch(/^US FDA action level/);
    expect(provenance).toMatch(/^published, read in /);
    // The level itself is not above it; one unit in the last place more is.
    const above = limit * (1 + 2 ** -52);
    const found = decisionAgreement([limit, limit, above, above], [limit, above, limit, above], { limit });
    expect(found).toMatchObject({ bothAccept: 1, falseReject: 1, falseAccept: 1, bothReject: 1 });
  });
});
