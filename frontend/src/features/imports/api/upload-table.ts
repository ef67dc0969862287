import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { checkImport } from './check-import.ts';

interface Upload {
  table: Table;
  file: File;
  /** Row of the headings, where it is not found by itself. */
  headerRow?: number | undefined;
}

/** Sends the file and has its rows checked at once; gives the import's id. Where its columns have to be mapped first its own page says so. */
async function uploadTable({ table, file, headerRow }: Upload): Promise<string> {
  const { id } = await bodyOf(
    api.POST('/imports', {
      // The document describes the file as a string of bytes; a form carries the file itself.
      body: { table, file: file as unknown as string },
      bodySerializer: () => {
        const form = new FormData();
        form.append('table', table);
        if (headerRow !== undefined) form.append('headerRow', String(headerRow));
        form.append('file', file);
        return form;
      },
    }),
  );
  await checkImport(id).catch(() => undefined);
  return id;
}

export function useUploadTable() {
  const client = useQueryClient();
  return useMutation({ mutationFn: uploadTable, onSettled: () => client.invalidateQueries({ queryKey: ['imports'] }) });
}
