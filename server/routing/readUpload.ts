import type { Request, Response } from 'express';
import multer from 'multer';
import { invalid, tooLarge } from '../errors.ts';
import type { Refusal } from '../errors.ts';

/** A route that takes one file as multipart/form-data: the name of its part and the most bytes it may have. */
export type Upload = { part: string; maxBytes: number };

/** What came: the name as the sender gave it, which may be anything, and the bytes. */
export type UploadedFile = { fileName: string; bytes: Buffer };

/** Boundaries and headers of the parts; more than this around a file is no file. */
const ENVELOPE_BYTES = 16_384;
/** How long the rest of a refused upload is read and dropped, so that its sender gets to see why. */
const LINGER_MS = 5_000;

/**
 * The file of a multipart request, held in memory: nothing of it is ever written to disk.
 *
 * @throws Refusal 413 as soon as it is announced or found to be too large, 422 when it is not one file
 */
export async function readUpload(
  request: Request,
  response: Response,
  upload: Upload,
): Promise<UploadedFile> {
  const most = upload.maxBytes + ENVELOPE_BYTES;
  const refusal = fileTooLarge(upload);
  try {
    if (Number(request.get('content-length') ?? 0) > most) throw refusal;
    // multer itself answers only once everything has come, and the length may have been a lie or left out.
    const file = await Promise.race([parse(request, response, upload), refuseBeyond(request, most, refusal)]);
    return { fileName: file.originalname, bytes: file.buffer };
  } catch (error) {
    dropTheRest(request, response);
    throw error;
  }
}

function parse(request: Request, response: Response, upload: Upload): Promise<Express.Multer.File> {
  const { part, maxBytes } = upload;
  const read = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maxBytes, files: 1, fields: 0, parts: 1 },
    defParamCharset: 'utf8',
  }).single(part);
  return new Promise((resolve, reject) => {
    read(request, response, (error: unknown) => {
      if (error !== undefined) reject(explain(error, upload));
      else if (request.file) resolve(request.file);
      else reject(invalid([{ path: part, message: 'is required: send the file as this part' }]));
    });
  });
}

function refuseBeyond(request: Request, most: number, refusal: Refusal): Promise<never> {
  let seen = 0;
  return new Promise((_resolve, reject) => {
    request.on('data', (piece: Buffer) => {
      seen += piece.length;
      if (seen > most) reject(refusal);
    });
  });
}

function explain(error: unknown, upload: Upload): Refusal {
  const code = error instanceof multer.MulterError ? error.code : null;
  if (code === 'LIMIT_FILE_SIZE') return fileTooLarge(upload);
  if (code !== null) {
    return invalid([{ path: upload.part, message: 'send one file in this part, and no other part' }]);
  }
  return invalid([{ path: '', message: 'the body is not multipart/form-data that can be read' }]);
}

const fileTooLarge = ({ maxBytes }: Upload) =>
  tooLarge(
    `The file is larger than ${maxBytes / 1e6} MB. Cut it into parts, or leave out what is not needed.`,
  );

/** Cutting the connection at once could lose the answer on its way; reading on for ever would be worse. */
function dropTheRest(request: Request, response: Response): void {
  response.once('finish', () => {
    if (request.complete) return;
    request.unpipe();
    request.resume();
    const patience = setTimeout(() => request.socket.destroy(), LINGER_MS);
    request.once('close', () => clearTimeout(patience));
  });
}
