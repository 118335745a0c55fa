'use client';

import { BarePage } from '@/components/shell/bare-page';
import type { BrokenProps } from '@/components/shell/blank-pages';
import { BrokenForm } from '@/components/shell/blank-pages';

export default function Broken(props: BrokenProps) {
  return (
    <BarePage>
      <BrokenForm {...props} />
    </BarePage>
  );
}
