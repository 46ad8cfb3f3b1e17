import { renderToStaticMarkup as render } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { columnDecimals, Figures, padForDecimals } from '@/components/ui/figures';
import { Signal, SignalMark } from '@/components/ui/signal';
import { NumberCell, Table, Td, Th } from '@/components/ui/table';

const MINUS = '\u2212';

describe('decimal alignment', () => {
  it('takes the most decimals of a column, as numbers or as reported', () => {
    expect(columnDecimals([1, 2], 2)).toBe(2);
    expect(columnDecimals(['12.30', '<2.0', null, '5'])).toBe(2);
    expect(columnDecimals([])).toBe(0);
  });

  it('gives each figure the same room behind the decimal sign', () => {
    for (const text of ['12.30', '<2.0', '5', '0.125', '>300']) {
      const filled = text + padForDecimals(text, 3);
      expect(filled.split('.')[1]).toHaveLength(3);
    }
    expect(padForDecimals('5', 0)).toBe('');
  });

  it('keeps the padding out of the text', () => {
    const html = render(<Figures value="5" columnDecimals={2} />);
    expect(html).toBe('<span class="figures" data-pad=".00">5</span>');
  });

  it('writes numbers with a true minus sign', () => {
    expect(render(<Figures value={-1.5} decimals={2} />)).toContain(`>${MINUS}1.50<`);
  });

  it('shows a grey dash where there is no figure', () => {
    expect(render(<Figures value={null} decimals={2} />)).toBe(
      '<span class="figures text-grey">\u2013</span>',
    );
  });
});

describe('Signal', () => {
  it('shows a score that is fine as plain ink', () => {
    const html = render(<Signal score={-0.53} signal="none" />);
    expect(html).toContain(`${MINUS}0.53`);
    expect(html).not.toMatch(/svg|warning|action/);
  });

  it('tells a warning by an open triangle and the word', () => {
    const html = render(<Signal score={2.998} signal="warning" />);
    expect(html).toContain('2.998');
    expect(html).toContain('<span class="">warning</span>');
    expect(html).toMatch(/<path d="M6 1.4[^>]*fill="none" stroke="currentColor"/);
  });

  it('tells an action signal by a filled square and the word', () => {
    const html = render(<Signal score={-8.9} signal="action" />);
    expect(html).toContain('<span class="">action</span>');
    expect(html).toMatch(/<path d="M1.2 1.2h9.6v9.6H1.2Z" fill="currentColor"/);
  });

  it('keeps the word for screen readers and paper in the compact form', () => {
    expect(render(<Signal score={3.2} signal="action" compact />)).toContain(
      '<span class="sr-only print:not-sr-only">action</span>',
    );
  });

  it('shows a grey dash for what is not scored, with the reason', () => {
    const html = render(<Signal score={null} signal="not-scored" why="below LOQ" />);
    expect(html).toContain('text-grey');
    expect(html).toContain('not scored');
    expect(html).toContain('below LOQ');
  });

  it('judges decimals by the kind of the score', () => {
    expect(render(<Signal score={1.001} signal="action" kind="e-n" />)).toContain('1.001');
  });

  it('can stand without its score', () => {
    expect(render(<SignalMark signal="none" />)).toBe('');
    expect(render(<SignalMark signal="not-scored" />)).toContain('not scored');
  });
});

describe('Table', () => {
  const html = render(
    <Table caption="Results">
      <thead>
        <tr>
          <Th>Code</Th>
          <Th numeric>Result</Th>
        </tr>
      </thead>
      <tbody>
        <tr>
          <Td>A1</Td>
          <NumberCell value={1.5} decimals={2} />
        </tr>
      </tbody>
    </Table>,
  );

  it('stands in a region that is named and can be scrolled by keys', () => {
    const id = /<div role="region" aria-labelledby="([^"]+)" tabindex="0"/.exec(html)?.[1];
    expect(html).toContain(`<caption id="${id}"`);
  });

  it('keeps its header in view and its numbers to the right', () => {
    expect(html).toMatch(/<th scope="col" class="[^"]*sticky/);
    expect(html).toMatch(/<td class="[^"]*text-right[^"]*"><span class="figures">1\.50<\/span>/);
  });
});
