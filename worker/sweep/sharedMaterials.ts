import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import type { SharedMaterial } from './liveCurve.ts';
import { materialKey } from './sweepInput.ts';

/** Materials kept as bytes at most; the one used last goes last. */
const MOST_KEPT = 64;

/** Materials as bytes that all threads share, made once for each version: tables are not copied at every curve. */
export class SharedMaterials {
  readonly #kept = new Map<string, { content: ResolvableMaterial['content']; shared: SharedMaterial }>();
  #made = 0;

  share(material: ResolvableMaterial): SharedMaterial {
    const key = materialKey(material);
    const before = this.#kept.get(key);
    this.#kept.delete(key);
    const { id, version, name, content } = material;
    const entry =
      before?.content === content
        ? before
        : { content, shared: { serial: (this.#made += 1), bytes: toShared({ id, version, name, content }) } };
    this.#kept.set(key, entry);
    for (const oldest of this.#kept.keys()) {
      if (this.#kept.size <= MOST_KEPT) break;
      this.#kept.delete(oldest);
    }
    return entry.shared;
  }
}

function toShared(material: ResolvableMaterial): SharedArrayBuffer {
  const bytes = new TextEncoder().encode(JSON.stringify(material));
  const shared = new SharedArrayBuffer(bytes.byteLength);
  new Uint8Array(shared).set(bytes);
  return shared;
}
