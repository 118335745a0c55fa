'use client';

import { BlankForm } from '@/components/shell/blank-form';
import { LinkButton } from '@/components/ui/button';
import { useCommon } from '@/components/ui/locale';
import { routes } from '@/lib/routes';

export default function Forbidden() {
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
