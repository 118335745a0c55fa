'use client';

import type { BrokenProps } from '@/components/shell/blank-pages';
import Broken from './error';
import { fontVariables } from './fonts';
import './globals.css';

/** Stands in for the whole page when even the frame broke. */
export default function GlobalError(props: BrokenProps) {
  return (
    <html lang="en" className={fontVariables}>
      <body>
        <title>Strikeoff</title>
        <Broken {...props} />
      </body>
    </html>
  );
}
