/** Requests under way at a time: one is answered while the next is on its way. */
const MOST_UNDER_WAY = 2;

type Options<Question, Answer> = {
  ask: (question: Question, signal: AbortSignal) => Promise<Answer>;
  onAnswer: (answer: Answer, question: Question) => void;
  /** Only for the newest question: that an older one failed is of no interest any more. */
  onError: (error: Error, question: Question) => void;
};

/**
 * Questions that follow each other quickly, as while somebody drags. Of those that wait only the newest is asked, and an
 * answer that comes after one to a newer question is dropped.
 */
export class LatestWins<Question, Answer> {
  readonly #options: Options<Question, Answer>;
  readonly #underWay = new Map<number, AbortController>();
  #waiting: { question: Question; number: number } | null = null;
  #asked = 0;
  #answered = 0;

  constructor(options: Options<Question, Answer>) {
    this.#options = options;
  }

  ask(question: Question): void {
    this.#waiting = { question, number: (this.#asked += 1) };
    this.#next();
  }

  /** Forgets everything; nothing is reported any more. */
  stop(): void {
    this.#waiting = null;
    this.#answered = this.#asked;
    for (const controller of this.#underWay.values()) controller.abort();
    this.#underWay.clear();
  }

  #next(): void {
    if (!this.#waiting || this.#underWay.size >= MOST_UNDER_WAY) return;
    const { question, number } = this.#waiting;
    this.#waiting = null;
    const controller = new AbortController();
    this.#underWay.set(number, controller);
    void this.#options
      .ask(question, controller.signal)
      .then(
        (answer) => this.#take(number, () => this.#options.onAnswer(answer, question)),
        (error: unknown) => {
          if (number !== this.#asked) return;
          const reason = error instanceof Error ? error : new Error(String(error));
          this.#take(number, () => this.#options.onError(reason, question));
        },
      )
      .finally(() => {
        this.#underWay.delete(number);
        this.#next();
      });
  }

  #take(number: number, report: () => void): void {
    if (number <= this.#answered) return;
    this.#answered = number;
    // Whatever older question is still under way would be dropped: the server need not go on with it.
    for (const [older, controller] of this.#underWay) if (older < number) controller.abort();
    report();
  }
}
