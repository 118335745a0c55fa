'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { company } from '@/lib/text/messages/en/company';

const words = company.keys;

/** A key just issued: the only time that it can be read. */
export function NewKey({ secret }: { secret: string }) {
  const [copied, setCopied] = useState(false);
  async function copy() {
    await navigator.clipboard.writeText(secret);
    setCopied(true);
  }
  return (
    <Notice tone="warning" title={words.onceTitle} className="mt-4">
      <p>{words.onceSays}</p>
      <p className="mt-2 flex flex-wrap items-center gap-3">
        <code className="max-w-full border border-wet bg-sheet px-2.5 py-1.5 font-code break-all select-all">
          {secret}
        </code>
        {/* Where the page is not served securely, the browser offers no clipboard: select by hand. */}
        {typeof navigator !== 'undefined' && 'clipboard' in navigator && (
          <Button variant="quiet" onClick={copy}>
            {words.copy}
          </Button>
        )}
        {copied && <span role="status">{words.copied}</span>}
      </p>
    </Notice>
  );
}
