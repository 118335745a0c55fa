import type { Metadata } from 'next';
import { ask, requirePage } from '@/lib/http/page';
import { previewImport } from '@/lib/services/imports/preview-import';
import { statements as words } from '@/lib/text/messages/en/statements';
import { PreviewScreen } from './_components/preview-screen';

export const metadata: Metadata = { title: words.import };

export default async function ImportPreviewPage({
  params,
}: {
  params: Promise<{ importId: string }>;
}) {
  const actor = await requirePage('statements.write');
  const { importId } = await params;
  const first = await ask(previewImport, actor, { importId });
  return <PreviewScreen first={first} />;
}
