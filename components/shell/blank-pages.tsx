'use client';

import { routes } from '@/lib/routes';
import { Button, LinkButton } from '../ui/button';
import { useCommon } from '../ui/locale';
import { BlankForm } from './blank-form';

/** Said of a record that is missing, and of another company's, alike. */
export function NotFoundForm() {
  const words = useCommon();
  return (
    <BlankForm
      title={words.notFound.title}
      actions={<LinkButton href={routes.home()}>{words.goHome}</LinkButton>}
    >
      {words.notFound.says}
    </BlankForm>
  );
}

export function ForbiddenForm() {
  const words = useCommon();
  return (
    <BlankForm
      title={words.forbidden.title}
      actions={<LinkButton href={routes.home()}>{words.goHome}</LinkButton>}
    >
      {words.forbidden.says}
    </BlankForm>
  );
}

/** What React's error boundaries are given. */
export interface BrokenProps {
  error: Error & { digest?: string };
  reset: () => void;
}

export function BrokenForm({ error, reset }: BrokenProps) {
  const words = useCommon();
  return (
    <BlankForm
      title={words.broken.title}
      actions={
        <>
          <Button onClick={reset}>{words.tryAgain}</Button>
          <LinkButton href={routes.home()}>{words.goHome}</LinkButton>
        </>
      }
    >
      <p>{words.broken.says}</p>
      {error.digest && (
        <p className="mt-3">
          {words.broken.reference} <span className="font-code text-ink">{error.digest}</span>
        </p>
      )}
    </BlankForm>
  );
}
