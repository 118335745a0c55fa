'use client';

import { fontVariables } from './fonts';
import './globals.css';
import ErrorPage from './error';

interface GlobalErrorProps {
  error: Error & { digest?: string };
  reset: () => void;
}

/** Stands in for the whole page when even the frame broke. */
export default function GlobalError(props: GlobalErrorProps) {
  return (
    <html lang="en" className={fontVariables}>
      <body>
        <title>Strikeoff</title>
        <ErrorPage {...props} />
      </body>
    </html>
  );
}
