import Form from 'next/form';
import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { TextInput } from '@/components/ui/controls';

type Query = Record<string, string | string[] | undefined>;

/** The search text and page number of a list's address. */
export function listQueryOf(query: Query): { text: string; page: number } {
  const text = typeof query.q === 'string' ? query.q.slice(0, 200) : '';
  const page = typeof query.page === 'string' && /^\d{1,6}$/.test(query.page) ? Number(query.page) : 1;
  return { text, page };
}

export function SearchForm({ path, text, label }: { path: string; text: string; label: string }) {
  return (
    <Form action={path} className="flex flex-wrap items-end gap-2">
      <TextInput
        key={text}
        name="q"
        type="search"
        label={label}
        defaultValue={text}
        className="w-full max-w-sm"
      />
      <Button type="submit">Search</Button>
      {text && (
        <Link href={path} className="text-link inline-flex min-h-11 md:min-h-9 items-center">
          Show all
        </Link>
      )}
    </Form>
  );
}

interface PagerProps {
  path: string;
  text: string;
  page: number;
  pageCount: number;
}

export function Pager({ path, text, page, pageCount }: PagerProps) {
  if (pageCount <= 1) return null;
  const to = (target: number) =>
    `${path}?${new URLSearchParams({ ...(text ? { q: text } : {}), page: String(target) }).toString()}`;
  return (
    <nav aria-label="Pages" className="flex flex-wrap items-center gap-4">
      {page > 1 && (
        <Link href={to(page - 1)} className="text-link" rel="prev">
          Previous page
        </Link>
      )}
      <span className="figures text-ink-soft">
        Page {page} of {pageCount}
      </span>
      {page < pageCount && (
        <Link href={to(page + 1)} className="text-link" rel="next">
          Next page
        </Link>
      )}
    </nav>
  );
}
