'use client';

import { SelectField, TextField } from '@/components/ui/field';
import { Section } from '@/components/ui/section';
import type {
  DateOrder,
  DecimalMark,
  Delimiter,
  Encoding,
  ImportLayout,
} from '@/importers/core/layout';
import { DELIMITERS, EMPTY_COLUMNS } from '@/importers/core/layout';
import type { BillCsvPreview } from '@/importers/core/plan';
import { preview as words } from '@/lib/text/messages/en/statements';

const ENCODINGS: readonly Encoding[] = ['utf-8', 'windows-1252', 'utf-16le', 'utf-16be'];

interface LayoutFieldsProps {
  preview: BillCsvPreview;
  onLayout: (layout: ImportLayout) => void;
}

/** How the bytes become a table; a change here has the columns guessed again. */
export function LayoutFields({ preview, onLayout }: LayoutFieldsProps) {
  const { layout } = preview;
  const again = (change: Partial<ImportLayout>) =>
    onLayout({ ...layout, headerSignature: null, columns: EMPTY_COLUMNS, ...change });
  return (
    <Section title={words.howRead}>
      <div className="grid max-w-4xl grid-cols-2 gap-4 md:grid-cols-5">
        <SelectField
          label={words.encoding}
          value={layout.encoding}
          onChange={(event) => again({ encoding: event.target.value as Encoding })}
        >
          {ENCODINGS.map((one) => (
            <option key={one}>{one}</option>
          ))}
        </SelectField>
        <SelectField
          label={words.delimiter}
          value={layout.delimiter}
          onChange={(event) => again({ delimiter: event.target.value as Delimiter })}
        >
          {DELIMITERS.map((one) => (
            <option key={one} value={one}>
              {words.delimiters[one]}
            </option>
          ))}
        </SelectField>
        <TextField
          label={words.titleRow}
          type="number"
          min={1}
          defaultValue={layout.headerRow ?? ''}
          key={layout.headerRow ?? 'none'}
          onBlur={(event) => {
            const line = event.target.value === '' ? null : Number(event.target.value);
            if (line !== layout.headerRow) again({ headerRow: line });
          }}
        />
        <SelectField
          label={words.dateOrder}
          value={layout.dateOrder}
          onChange={(event) => onLayout({ ...layout, dateOrder: event.target.value as DateOrder })}
        >
          {Object.entries(words.dateOrders).map(([value, text]) => (
            <option key={value} value={value}>
              {text}
            </option>
          ))}
        </SelectField>
        <SelectField
          label={words.decimalMark}
          value={layout.decimalMark}
          onChange={(event) =>
            onLayout({ ...layout, decimalMark: event.target.value as DecimalMark })
          }
        >
          {Object.entries(words.decimalMarks).map(([value, text]) => (
            <option key={value} value={value}>
              {text}
            </option>
          ))}
        </SelectField>
      </div>
    </Section>
  );
}
