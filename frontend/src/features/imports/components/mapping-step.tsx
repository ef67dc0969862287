import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { type ReactNode, useRef, useState } from 'react';
import { Failure, Notice, Pending } from '../../../components/ui/states.tsx';
import { type Mapping, type MappingSheet, useMapping } from '../api/get-mapping.ts';
import { HeaderRowChoice } from './header-row-choice.tsx';
import { MappingForm } from './mapping-form.tsx';

const originWords: Record<MappingSheet['origin'], string> = {
  saved: 'As chosen before; go on from here.',
  remembered: 'A file with these headings came before: its columns are read the same way. Look whether that still holds.',
  suggested: 'Suggested by the words of the headings. Look at each column: nothing is taken without your word.',
};

/** How the columns of a file become ours. Another row of headings is tried by asking the server how the file reads from there. */
export function MappingStep({ record, aside }: { record: Import; aside: ReactNode }) {
  const [tried, setTried] = useState<number>();
  const written = useRef<Mapping['constants']>(undefined);
  const query = useMapping(record.id, tried);
  if (query.isPending) return <Pending what="Reading the first rows" />;
  if (!query.data)
    return <Failure error={query.error} what="read the first rows" retry={() => (tried ? setTried(undefined) : void query.refetch())} />;
  const sheet = query.data;
  const { origin, mapping } = sheet;
  // What was written for every row stays when only the headings stand elsewhere.
  const constants = (origin === 'suggested' && written.current) || mapping.constants;
  return (
    <div className="flex flex-col gap-8">
      <Notice title={originWords[origin]}>
        <p className="text-ink-2">
          Each choice is kept as you make it. A blank cell leaves what is stored alone.
          {record.status === 'checked' && ' A change here means checking the rows again; cells you mended stay mended.'}
        </p>
      </Notice>
      <HeaderRowChoice top={sheet.top} value={tried ?? mapping.headerRow} onChange={setTried} />
      <MappingForm
        key={mapping.headerRow}
        record={record}
        first={sheet}
        firstDraft={{ ...mapping, constants }}
        onDraft={(draft) => {
          written.current = draft.constants;
        }}
        aside={aside}
      />
    </div>
  );
}
