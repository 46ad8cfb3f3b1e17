import { renderToStaticMarkup as render } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { Button, ButtonLink } from '@/components/ui/button';
import { Caution } from '@/components/ui/caution';
import { Checkbox, DateTimeInput, NumberInput, Select, TextArea, TextInput } from '@/components/ui/controls';
import { CopyButton } from '@/components/ui/copy-button';
import { EmptyState } from '@/components/ui/empty-state';
import { Facts } from '@/components/ui/facts';
import { FormMessage } from '@/components/ui/form-message';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import { SiteFooter } from '@/components/ui/site-footer';
import { SiteHeader } from '@/components/ui/site-header';
import { Skeleton } from '@/components/ui/skeleton';
import { StateTag } from '@/components/ui/state-tag';
import { SubmitButton } from '@/components/ui/submit-button';
import { readTheme } from '@/components/ui/theme';
import { ThemeSwitch } from '@/components/ui/theme-switch';
import { Tooltip } from '@/components/ui/tooltip';

describe('buttons', () => {
  it('are of type button unless told otherwise', () => {
    expect(render(<Button>Save</Button>)).toMatch(/<button type="button"[^>]*>Save<\/button>/);
    expect(render(<SubmitButton>Save</SubmitButton>)).toContain('type="submit"');
  });

  it('keep the focus but do nothing while work is pending', () => {
    const html = render(
      <Button type="submit" pending pendingLabel="Saving">
        Save
      </Button>,
    );
    expect(html).toContain('type="button"');
    expect(html).toContain('aria-disabled="true"');
    expect(html).toContain('aria-busy="true"');
    expect(html).toContain('>Saving</button>');
    expect(html).not.toContain(' disabled=""');
  });

  it('are links where they lead to a page', () => {
    expect(render(<ButtonLink href="/rounds">Rounds</ButtonLink>)).toMatch(/<a [^>]*href="\/rounds"/);
  });
});

describe('fields', () => {
  it('tie label, hint and error to the control', () => {
    const html = render(
      <TextInput id="name" name="name" label="Name" hint="As printed" error="Enter a name" />,
    );
    expect(html).toContain('<label for="name"');
    expect(html).toContain('aria-describedby="name-hint name-error"');
    expect(html).toContain('aria-invalid="true"');
    expect(html).toContain('<p id="name-hint"');
    expect(html).toMatch(/aria-live="polite"><p id="name-error"/);
  });

  it('say nothing of errors when there are none, but keep the live region', () => {
    const html = render(<TextInput id="name" label="Name" />);
    expect(html).not.toContain('aria-invalid="');
    expect(html).not.toContain('aria-describedby');
    expect(html).toContain('<div aria-live="polite"></div>');
  });

  it('take figures as text with a decimal keyboard', () => {
    const html = render(<NumberInput id="r" label="Result" unit="ug/kg" />);
    expect(html).toContain('inputMode="decimal"');
    expect(html).toContain('type="text"');
    expect(html).toContain('ug/kg');
  });

  it('say that times are in UTC', () => {
    const html = render(<DateTimeInput id="c" label="Closes" />);
    expect(html).toContain('type="datetime-local"');
    expect(html).toContain('Time in UTC');
    expect(render(<DateTimeInput id="c" label="Analysed on" dateOnly />)).not.toContain('UTC');
  });

  it('wire the other controls the same way', () => {
    const options = [{ value: 'a', label: 'Alpha' }];
    expect(render(<Select id="s" label="S" options={options} error="Choose one" />)).toMatch(
      /<select[^>]*aria-describedby="s-error"/,
    );
    expect(render(<TextArea id="t" label="T" optional />)).toMatch(/<textarea[^>]*id="t"/);
    expect(render(<Checkbox id="k" label="Late" hint="Marked" />)).toMatch(
      /<input[^>]*aria-describedby="k-hint"[^>]*type="checkbox"/,
    );
  });

  it('make an id of their own when none is given', () => {
    const html = render(<TextInput label="Name" />);
    const id = /for="([^"]+)"/.exec(html)?.[1];
    expect(id).toBeTruthy();
    expect(html).toContain(` id="${id}"`);
  });
});

describe('messages', () => {
  it.each([
    ['info', 'Note'],
    ['warning', 'Warning'],
    ['problem', 'Problem'],
    ['done', 'Done'],
  ] as const)('a notice of kind %s has a shape and the word %s', (kind, word) => {
    const html = render(<Notice kind={kind}>Text</Notice>);
    expect(html).toContain('<svg');
    expect(html).toContain(word);
  });

  it('a form message is a live region even when empty', () => {
    expect(render(<FormMessage />)).toBe('<div aria-live="polite"></div>');
    expect(render(<FormMessage>Nothing was stored.</FormMessage>)).toContain('Problem');
  });

  it('cautions defer to the safety data sheet, own procedures and local rules', () => {
    const html = render(<Caution />);
    for (const words of ['toxic', 'flammable', 'Dust', 'safety data sheet', 'procedures', 'local rules']) {
      expect(html).toContain(words);
    }
    expect(render(<Caution kind="score" />)).toContain('does not say that a lot is safe');
    expect(render(<Caution kind="limit" />)).toContain('confirms the limit');
  });
});

describe('page parts', () => {
  it('a page header has one main heading and the way back', () => {
    const html = render(
      <PageHeader
        title="Winter round"
        lead="Open"
        breadcrumb={[{ href: '/rounds', label: 'Rounds' }]}
        actions="x"
      />,
    );
    expect(html.match(/<h1/g)).toHaveLength(1);
    expect(html).toContain('href="/rounds"');
  });

  it('facts are a description list', () => {
    expect(render(<Facts items={[{ label: 'Unit', value: 'ug/kg', hint: 'UCUM' }]} />)).toMatch(
      /<dl.*<dt[^>]*>Unit<\/dt><dd[^>]*>ug\/kg/,
    );
  });

  it('an empty state says what will be here and offers the first step', () => {
    const html = render(
      <EmptyState title="No rounds yet" action={<Button>Plan a round</Button>}>
        Rounds appear here.
      </EmptyState>,
    );
    expect(html).toContain('Rounds appear here.');
    expect(html).toContain('Plan a round');
  });

  it('a skeleton says that it is loading', () => {
    expect(render(<Skeleton />)).toMatch(/role="status".*Loading/);
  });

  it('the site header marks the current place and lets the keyboard skip it', () => {
    const html = render(
      <SiteHeader
        links={[
          { href: '/rounds', label: 'Rounds', current: true },
          { href: '/studies', label: 'Studies' },
        ]}
        right="M. Okonjo"
      />,
    );
    expect(html).toContain('href="#main"');
    expect(html.match(/aria-current="page"/g)).toHaveLength(2);
    expect(html).toContain('<summary');
    expect(html).toContain('border-b-maize');
  });

  it('the site footer shows the version', () => {
    expect(render(<SiteFooter version="0.1.0" links={[{ href: '/check', label: 'Check' }]} />)).toContain(
      'Assize 0.1.0',
    );
  });

  it('states are said in plain words', () => {
    expect(render(<StateTag of="round" state="evaluated" />)).toContain('waiting for sign-off');
    expect(render(<StateTag of="enrolment" state="withdrawn" />)).toContain('withdrawn');
    expect(render(<StateTag of="submission" state="superseded" />)).toContain('replaced by a later one');
  });

  it('small client parts are drawn on the server too', () => {
    expect(render(<CopyButton text="abc" />)).toContain('Copy');
    expect(render(<ThemeSwitch initial="dark" />)).toMatch(/<input[^>]*checked=""[^>]*value="dark"/);
    expect(render(<Tooltip text="gloss">z</Tooltip>)).toContain('>z</button>');
  });

  it('an unknown theme cookie follows the system', () => {
    expect([readTheme('dark'), readTheme('purple'), readTheme(undefined)]).toEqual([
      'dark',
      'system',
      'system',
    ]);
  });
});
