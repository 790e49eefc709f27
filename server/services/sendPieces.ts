import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';

/** Writes an answer piece by piece, no faster than it is read. */
export async function sendPieces(
  pieces: AsyncIterable<Uint8Array | string> | Iterable<Uint8Array | string>,
  response: Response,
): Promise<void> {
  try {
    await pipeline(Readable.from(pieces), response);
  } catch (error) {
    // The reader went away: nobody is left to be told.
    if (error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE') return;
    throw error;
  }
}
