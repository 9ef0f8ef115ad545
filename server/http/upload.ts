import { open, rm } from 'node:fs/promises';

import type { Request, Response } from 'express';
import multer from 'multer';

import { InvalidInput, TooLarge, UnsupportedMedia } from './errors';
import type { Route, Upload, UploadKind } from './route';

const MAX_FIELDS = 10;
const MAX_FIELD_BYTES = 10_000;

const MEDIA_TYPES: Readonly<Record<UploadKind, string>> = {
  pdf: 'application/pdf',
  png: 'image/png',
  jpeg: 'image/jpeg',
  webp: 'image/webp',
  csv: 'text/csv',
};

const EXTENSIONS: Readonly<Record<UploadKind, RegExp>> = {
  pdf: /\.pdf$/i,
  png: /\.png$/i,
  jpeg: /\.jpe?g$/i,
  webp: /\.webp$/i,
  csv: /\.(csv|txt)$/i,
};

/**
 * Takes the one file of a multipart request into the upload folder and says what it is, by its
 * content and its name alike. Text fields land in `req.body`.
 */
export async function receiveUpload(
  req: Request,
  res: Response,
  { multipart, folder }: { multipart: NonNullable<Route['multipart']>; folder: string },
): Promise<Upload> {
  if (!req.is('multipart/form-data')) {
    throw new UnsupportedMedia('Send the file as multipart/form-data.');
  }
  await receive(req, res, { folder, maxBytes: multipart.maxBytes });
  const file = req.file;
  if (!file) {
    throw new InvalidInput([{ path: 'file', message: 'Choose a file.', allowed: 'one file' }]);
  }
  try {
    return {
      path: file.path,
      name: file.originalname,
      sizeBytes: file.size,
      mediaType: MEDIA_TYPES[await kindOf(file, multipart.kinds)],
    };
  } catch (error) {
    await discardUpload(file.path);
    throw error;
  }
}

export function discardUpload(path: string): Promise<void> {
  return rm(path, { force: true });
}

function receive(
  req: Request,
  res: Response,
  { folder, maxBytes }: { folder: string; maxBytes: number },
): Promise<void> {
  const single = multer({
    dest: folder,
    defParamCharset: 'utf8',
    limits: {
      fileSize: maxBytes,
      files: 1,
      fields: MAX_FIELDS,
      parts: MAX_FIELDS + 1,
      fieldSize: MAX_FIELD_BYTES,
      fieldNameSize: 100,
      headerPairs: 20,
    },
  }).single('file');
  return new Promise((resolve, reject) => {
    single(req, res, (error: unknown) => {
      if (error) reject(refusalOf(error, maxBytes));
      else resolve();
    });
  });
}

/** Every error of the multipart parser is the sender's. */
function refusalOf(error: unknown, maxBytes: number): Error {
  if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') {
    return new TooLarge(`A file has at most ${Math.floor(maxBytes / 1024 / 1024)} MB.`);
  }
  const { code } = error as { code?: unknown };
  if (typeof code === 'string' && /^E[A-Z]+$/.test(code)) return error as Error;
  return new InvalidInput([
    {
      path: 'file',
      message: 'The upload is broken or has parts that are not taken here.',
      allowed: 'one file in the field "file", and the named text fields',
    },
  ]);
}

async function kindOf(
  file: Express.Multer.File,
  kinds: readonly UploadKind[],
): Promise<UploadKind> {
  const kind = await kindByContent(file.path);
  if (kind === undefined || !kinds.includes(kind) || !EXTENSIONS[kind].test(file.originalname)) {
    throw new InvalidInput([
      {
        path: 'file',
        message:
          'The content of this file is not of a kind that is taken here, or not what its name says.',
        allowed: kinds.map((it) => it.toUpperCase()).join(', '),
      },
    ]);
  }
  return kind;
}

async function kindByContent(path: string): Promise<UploadKind | undefined> {
  const head = await readHead(path, 8192);
  // Loaded with the first upload: a start does not wait for it.
  const { fileTypeFromBuffer } = await import('file-type');
  const found = await fileTypeFromBuffer(head);
  if (found) {
    return (Object.keys(MEDIA_TYPES) as UploadKind[]).find(
      (kind) => MEDIA_TYPES[kind] === found.mime,
    );
  }
  return isText(head) ? 'csv' : undefined;
}

async function readHead(path: string, bytes: number): Promise<Buffer> {
  const handle = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(bytes), 0, bytes, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await handle.close();
  }
}

/** No control characters but tab and line ends; the encoding itself is the reader's matter. */
function isText(head: Buffer): boolean {
  return head.length > 0 && head.every((byte) => byte >= 32 || [9, 10, 13].includes(byte));
}
