import { isDeepStrictEqual } from 'node:util';
import type { CardMaker, CardProgress, MakeCard } from '../dependencies.ts';
import { conflict } from '../errors.ts';
import type { GrowthCard } from '../models/growthCard.ts';

type Making = {
  wanted: object;
  card: Promise<GrowthCard>;
  progress: CardProgress;
  /** Requests that wait for the card. */
  askers: number;
  ending: AbortController;
};

/**
 * The growth cards that this process makes while somebody waits for them. Nothing of them is stored before they are
 * done: whoever hangs up, or a process that ends, leaves nothing behind.
 */
export class CardMakings implements CardMaker {
  readonly #underWay = new Map<string, Making>();
  /** Those that nobody waits for, until they have ended: one that is just being stored may still be. */
  readonly #leaving = new Map<string, Making>();

  /**
   * Makes a card; a request sent again while it is being made waits for the same card. It ends when all have hung up.
   *
   * @param id the same for a request sent twice
   * @param hungUp of this request
   * @throws Refusal 409 when another card is being made under this id, and whatever `make` throws
   */
  make(id: string, wanted: object, hungUp: AbortSignal, make: MakeCard): Promise<GrowthCard> {
    const before = this.#underWay.get(id);
    if (before && !isDeepStrictEqual(before.wanted, wanted)) {
      return Promise.reject(conflict('This Idempotency-Key is used for another card: send a new one.'));
    }
    const making = before ?? this.#begin(id, wanted, make);
    making.askers += 1;
    const leave = () => {
      making.askers -= 1;
      if (making.askers > 0) return;
      // The same request sent once more begins anew.
      if (this.#underWay.get(id) === making) {
        this.#underWay.delete(id);
        this.#leaving.set(id, making);
      }
      making.ending.abort();
    };
    if (hungUp.aborted) leave();
    else hungUp.addEventListener('abort', leave, { once: true });
    return making.card;
  }

  /** How far this process is with it, also while it ends; null when it does not make it. */
  progressOf(id: string): CardProgress | null {
    return (this.#underWay.get(id) ?? this.#leaving.get(id))?.progress ?? null;
  }

  #begin(id: string, wanted: object, make: MakeCard): Making {
    const ending = new AbortController();
    const report: Parameters<MakeCard>[1] = (progress) => {
      const bandsSince = making.progress.bandsSince ?? Date.now();
      making.progress = { ...progress, bandsSince };
    };
    const making: Making = {
      ...{ wanted, ending, askers: 0 },
      progress: { step: 'film', done: 0, total: 0, bandsSince: null },
      // After this function, so that nothing is reported before there is somewhere to write it.
      card: Promise.resolve().then(() => make(ending.signal, report)),
    };
    this.#underWay.set(id, making);
    making.card.then(
      () => this.#forget(id, making),
      () => this.#forget(id, making),
    );
    return making;
  }

  #forget(id: string, making: Making): void {
    for (const makings of [this.#underWay, this.#leaving]) {
      if (makings.get(id) === making) makings.delete(id);
    }
  }
}
