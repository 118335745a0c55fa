'use client';

import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useId, useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { SelectField } from '@/components/ui/field';
import { useLocale } from '@/components/ui/locale';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import type { DemoFile } from '@/lib/contracts/demo';
import { uploadImportOutput } from '@/lib/contracts/imports';
import { ApiFailure, apiUpload } from '@/lib/queries/api';
import { demoFile } from '@/lib/queries/demo';
import { routes } from '@/lib/routes';
import { importing as words } from '@/lib/text/messages/en/statements';
import { failureText } from '@/lib/text/problems';

interface ImportFormProps {
  suppliers: readonly { id: string; name: string }[];
  startSupplierId: string;
  demoFiles: readonly DemoFile[];
}

type State =
  | { readonly is: 'idle' }
  | { readonly is: 'reading'; readonly fileName: string }
  | { readonly is: 'problem'; readonly text: string }
  | { readonly is: 'known'; readonly id: string; readonly number: string };

/** Who sent it, and the file; the preview follows. Nothing is written before it is accepted. */
export function ImportForm({ suppliers, startSupplierId, demoFiles }: ImportFormProps) {
  const router = useRouter();
  const locale = useLocale();
  const fileId = useId();
  const [supplierId, setSupplierId] = useState(startSupplierId);
  const [missing, setMissing] = useState(false);
  const [over, setOver] = useState(false);
  const [state, setState] = useState<State>({ is: 'idle' });

  async function send(file: File, from: string): Promise<void> {
    if (from === '') {
      setMissing(true);
      return;
    }
    setState({ is: 'reading', fileName: file.name });
    try {
      const sent = { body: file, name: file.name };
      const answer = await apiUpload('/api/imports', sent, uploadImportOutput, {
        supplierId: from,
      });
      if (answer.statement) setState({ is: 'known', ...answer.statement });
      else router.push(routes.importPreview(answer.importId));
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      setState({ is: 'problem', text: failureText(locale, error) });
    }
  }

  async function tryOut(demo: DemoFile): Promise<void> {
    const supplier = suppliers.find((one) => one.name === demo.of);
    if (!supplier) return;
    setSupplierId(supplier.id);
    await send(await demoFile(demo.name), supplier.id);
  }

  const busy = state.is === 'reading';
  return (
    <div className="grid max-w-3xl gap-2 pb-8">
      <div className="grid gap-4 px-4 pt-5 md:px-6">
        <SelectField
          label={words.supplier}
          value={supplierId}
          error={missing && supplierId === '' ? words.supplierNeeded : undefined}
          onChange={(event) => setSupplierId(event.target.value)}
          fieldClassName="max-w-sm"
        >
          <option value="">{words.chooseSupplier}</option>
          {suppliers.map((one) => (
            <option key={one.id} value={one.id}>
              {one.name}
            </option>
          ))}
        </SelectField>
        {/* biome-ignore lint/a11y/noStaticElementInteractions: dropping is an extra; the field inside does the same */}
        <div
          onDragOver={(event) => {
            event.preventDefault();
            setOver(true);
          }}
          onDragLeave={() => setOver(false)}
          onDrop={(event) => {
            event.preventDefault();
            setOver(false);
            const [file] = event.dataTransfer.files;
            if (file && !busy) void send(file, supplierId);
          }}
          className={classNames(
            'grid justify-items-start gap-3 border-2 border-dashed px-5 py-7',
            over ? 'border-carbon bg-band' : 'border-wet bg-pink-soft',
          )}
        >
          <p className="font-head text-lg font-semibold">{words.file}</p>
          <p className="text-[14.5px] text-ink-soft">{words.says}</p>
          <p className="flex flex-wrap items-center gap-3">
            <span className="max-md:hidden">{words.drop}</span>
            <label
              htmlFor={fileId}
              className="inline-flex min-h-11 items-center rounded-[3px] border border-carbon bg-carbon px-4 font-semibold text-carbon-on focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-carbon hover:bg-ink hover:text-paper"
            >
              {words.choose}
              <input
                id={fileId}
                type="file"
                accept=".csv,.txt,.tsv,text/csv,text/plain"
                disabled={busy}
                className="sr-only"
                onChange={(event) => {
                  const file = event.target.files?.[0];
                  event.target.value = '';
                  if (file) void send(file, supplierId);
                }}
              />
            </label>
          </p>
          {busy && (
            <p role="status" className="text-[14.5px]">
              {words.reading} {state.fileName}
            </p>
          )}
        </div>
        {state.is === 'problem' && <Notice tone="error">{state.text}</Notice>}
        {state.is === 'known' && (
          <Notice tone="info">
            {words.already(state.number)}{' '}
            <Link href={routes.statement(state.id)}>{words.openStatement}</Link>
          </Notice>
        )}
      </div>
      {demoFiles.length > 0 && (
        <Section title={words.tryTitle} says={words.trySays}>
          <ul className="grid gap-2">
            {demoFiles.map((file) => (
              <li key={file.name} className="flex flex-wrap items-center gap-3">
                <Button variant="quiet" disabled={busy} onClick={() => tryOut(file)}>
                  {words.tryOne(file.of)}
                </Button>
                <a href={`/api/demo/files/${file.name}`} download className="text-[14px]">
                  {words.download} {file.name}
                </a>
              </li>
            ))}
          </ul>
        </Section>
      )}
    </div>
  );
}
