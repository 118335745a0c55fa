'use client';

import type { BrokenProps } from '@/components/shell/blank-pages';
import { BrokenForm } from '@/components/shell/blank-pages';

/** Here as well as at the root, so that a broken page keeps the tabs above it. */
export default function SiteBroken(props: BrokenProps) {
  return (
    <div className="px-4">
      <BrokenForm {...props} />
    </div>
  );
}
