import { classNames } from '@/components/ui/class-names';
import { Section } from '@/components/ui/section';
import type { BillCsvPreview } from '@/importers/core/plan';
import { preview as words } from '@/lib/text/messages/en/statements';

const LOOKS = {
  error: 'border-l-keel',
  warning: 'border-l-canary-deep',
  guess: 'border-l-wet',
} as const;

/** Everything that was wrong or had to be guessed, each with its line and what to do. */
export function Diagnostics({ preview }: { preview: BillCsvPreview }) {
  const { diagnostics, moreDiagnostics } = preview;
  if (diagnostics.length === 0) return null;
  return (
    <Section title={words.problems}>
      <ul className="grid max-w-4xl gap-1.5">
        {diagnostics.map((one) => (
          <li
            key={`${one.code} ${one.sentence}`}
            className={classNames('border-l-[5px] py-0.5 pl-3 text-[14px]', LOOKS[one.severity])}
          >
            <span className="font-semibold">{words.severities[one.severity]}: </span>
            {one.sentence} <span className="text-ink-soft">{one.hint}</span>
            {one.severity !== 'guess' && one.raw && (
              <code className="block overflow-x-auto font-code text-[12.5px] text-ink-soft">
                {one.raw}
              </code>
            )}
          </li>
        ))}
        {moreDiagnostics > 0 && <li>{words.more(moreDiagnostics)}</li>}
      </ul>
    </Section>
  );
}
