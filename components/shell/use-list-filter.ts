'use client';

import { usePathname, useSearchParams } from 'next/navigation';

/**
 * A list's filters live in the page's address, so that a filtered list can be linked to and the
 * back button undoes a filter. Changing one starts again at the first page.
 */
export function useListFilter() {
  const pathname = usePathname();
  const params = useSearchParams();

  function go(next: URLSearchParams) {
    const text = next.toString();
    window.history.replaceState(null, '', text ? `${pathname}?${text}` : pathname);
  }
  return {
    /** All filters as the API's query wants them. */
    query: Object.fromEntries(params.entries()),
    get: (name: string) => params.get(name) ?? '',
    set(name: string, value: string) {
      const next = new URLSearchParams(params);
      if (value) next.set(name, value);
      else next.delete(name);
      if (name !== 'offset') next.delete('offset');
      go(next);
    },
    /** Several at once, so that the address goes through no state between them. */
    setAll(values: Readonly<Record<string, string>>) {
      const next = new URLSearchParams(params);
      for (const [name, value] of Object.entries(values)) next.set(name, value);
      next.delete('offset');
      go(next);
    },
    clear: () => go(new URLSearchParams()),
  };
}
