'use client';

import type { ReactNode } from 'react';
import { Notice } from '../ui/notice';

interface ApiFormProps {
  /** What `useApiForm` gave. */
  state: {
    readonly submit: (event?: React.BaseSyntheticEvent) => Promise<void>;
    readonly problem: string | null;
  };
  children: ReactNode;
  className?: string;
  'aria-label'?: string;
}

/** The form element of `useApiForm`, with its general failure above the fields. */
export function ApiForm({ state, children, className, ...rest }: ApiFormProps) {
  return (
    <form noValidate method="post" onSubmit={state.submit} className={className} {...rest}>
      {state.problem && <Notice tone="error">{state.problem}</Notice>}
      {children}
    </form>
  );
}
