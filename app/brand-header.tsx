import Link from 'next/link';
import { BrandMark } from '@/components/ui/shapes';

/** The head of pages that stand outside every layout and must not depend on who is signed in. */
export function BrandHeader() {
  return (
    <header className="no-print border-b">
      <div className="mx-auto flex min-h-14 max-w-page items-stretch px-4 md:px-6">
        <Link href="/" className="flex items-center gap-2 font-serif text-xl font-semibold text-ink">
          <BrandMark />
          Assize
        </Link>
      </div>
    </header>
  );
}
