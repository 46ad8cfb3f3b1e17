import { gzipSync } from 'node:zlib';
import { getPage } from './session.mjs';

const BYTES_PER_KB = 1_000;

/** Size in kB, gzipped, of the scripts that a page's HTML names; those for browsers without modules do not count. */
export async function firstLoadKilobytes(baseUrl, page, cookie) {
  const scripts = scriptsOf(await getPage(baseUrl, page, cookie));
  const sizes = await Promise.all(
    scripts.map(async (address) => {
      const response = await fetch(new URL(address, baseUrl));
      if (!response.ok) throw new Error(`${address} answers with status ${response.status}`);
      return gzipSync(Buffer.from(await response.arrayBuffer())).length;
    }),
  );
  return sizes.reduce((sum, size) => sum + size, 0) / BYTES_PER_KB;
}

export function scriptsOf(html) {
  const tags = html.match(/<script\b[^>]*>|<link\b[^>]*>/gi) ?? [];
  const named = tags.flatMap((tag) => {
    const isScript = /^<script/i.test(tag) ? !/\bnomodule\b/i.test(tag) : /\bas="script"/i.test(tag);
    const address = /\b(?:src|href)="([^"]+)"/i.exec(tag)?.[1];
    return isScript && address ? [address.replaceAll('&amp;', '&')] : [];
  });
  return [...new Set(named)];
}
