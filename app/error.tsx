'use client';

import { BlankForm } from '@/components/shell/blank-form';
import { Button, LinkButton } from '@/components/ui/button';
import { useCommon } from '@/components/ui/locale';
import { routes } from '@/lib/routes';

interface ErrorProps {
  error: Error & { digest?: string };
  reset: () => void;
}

export default function ErrorPage({ error, reset }: ErrorProps) {
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
