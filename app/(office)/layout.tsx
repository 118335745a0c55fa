import type { ReactNode } from 'react';
import { OfficeShell } from '@/components/shell/office-shell';
import { requirePage } from '@/lib/http/page';

export default async function OfficeLayout({ children }: { children: ReactNode }) {
  const actor = await requirePage('self.use');
  return <OfficeShell actor={actor}>{children}</OfficeShell>;
}
