import { RuledTable, Td, Th } from '@/components/ui/ruled-table';
import type { ImportLayout, TargetField } from '@/importers/core/layout';
import { TARGET_FIELD_LABELS, TARGET_FIELDS } from '@/importers/core/layout';
import type { BillCsvPreview } from '@/importers/core/plan';
import { preview as words } from '@/lib/text/messages/en/statements';

interface ColumnTableProps {
  preview: BillCsvPreview;
  readOnly: boolean;
  onLayout: (layout: ImportLayout) => void;
}

/** The layout with a column given to a field; whatever held the field before lets it go. */
function withField(layout: ImportLayout, index: number, field: TargetField | null): ImportLayout {
  const columns = { ...layout.columns };
  for (const one of TARGET_FIELDS) if (columns[one] === index) columns[one] = null;
  if (field !== null) columns[field] = index;
  return { ...layout, columns };
}

/** Each column of the file with what it is taken to hold, to be corrected. */
export function ColumnTable({ preview, readOnly, onLayout }: ColumnTableProps) {
  return (
    <RuledTable caption={words.columns} slipsOnPhone>
      <thead>
        <tr>
          <Th>{words.column}</Th>
          <Th>{words.holds}</Th>
          <Th>{words.looksLike}</Th>
          <Th>{words.why}</Th>
        </tr>
      </thead>
      <tbody>
        {preview.columns.map((column) => {
          const title = column.title || words.untitled(column.index);
          return (
            <tr key={column.index}>
              <Td className="font-semibold">{title}</Td>
              <Td>
                <select
                  aria-label={`${title}: ${words.holds}`}
                  value={column.field ?? ''}
                  disabled={readOnly}
                  onChange={(event) =>
                    onLayout(
                      withField(
                        preview.layout,
                        column.index,
                        (event.target.value || null) as TargetField | null,
                      ),
                    )
                  }
                  className="min-h-11 w-full max-w-64 border border-wet bg-sheet px-2 md:min-h-8"
                >
                  <option value="">{words.notUsed}</option>
                  {TARGET_FIELDS.map((field) => (
                    <option key={field} value={field}>
                      {TARGET_FIELD_LABELS[field]}
                    </option>
                  ))}
                </select>
              </Td>
              <Td className="font-code text-[13px] text-ink-soft">{column.samples.join(' · ')}</Td>
              <Td className="text-[13px] text-ink-soft">
                {column.confidence && words.confidences[column.confidence]}
                {column.why && `: ${column.why}`}
              </Td>
            </tr>
          );
        })}
      </tbody>
    </RuledTable>
  );
}
