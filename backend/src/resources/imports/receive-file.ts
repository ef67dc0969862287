// multer writes the file of a form into the uploads folder under a name of ours.
import { randomUUID } from 'node:crypto';
import type { Request, Response } from 'express';
import multer from 'multer';
import { ApiProblem } from '../../errors.ts';

export interface ReceivedForm {
  file: { storedAs: string; fileName: string };
  fields: Record<string, unknown>;
}

/** @throws MulterError for a file too large or misnamed; ApiProblem where the form has none. Nothing stays on disk then. */
export function fileReceiver(folder: string, maxBytes: number): (req: Request, res: Response) => Promise<ReceivedForm> {
  const storage = multer.diskStorage({ destination: folder, filename: (_req, _file, done) => done(null, randomUUID()) });
  const receive = multer({ storage, limits: { fileSize: maxBytes, files: 1, fields: 10, fieldSize: 10_000 } }).single('file');
  return async (req, res) => {
    if (!req.is('multipart/form-data'))
      throw new ApiProblem('unsupported-media-type', 'Send the file as multipart/form-data, in the field `file`.');
    await new Promise<void>((resolve, reject) => receive(req, res, (error: unknown) => (error ? reject(error) : resolve())));
    if (!req.file)
      throw new ApiProblem('invalid-input', 'file: the form holds no file.', [
        { path: '/file', code: 'required', message: 'Send the table in the field `file`.' },
      ]);
    return {
      file: { storedAs: req.file.filename, fileName: plainName(req.file.originalname) },
      fields: { ...(req.body as Record<string, unknown>) },
    };
  };
}

/** busboy reads names as Latin-1; browsers send UTF-8. Folders and control characters are left out. */
function plainName(name: string): string {
  const decoded = Buffer.from(name, 'latin1').toString('utf8');
  const readable = decoded.includes('�') ? name : decoded;
  return (
    readable
      .split(/[\\/]/)
      .at(-1)!
      .replace(/\p{Cc}/gu, '')
      .slice(0, 200) || 'table.csv'
  );
}
