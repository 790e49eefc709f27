import { useId } from 'react';
import type { ReactNode } from 'react';

export type HabitChoice<Value extends string> = {
  value: Value;
  label: ReactNode;
  /** What follows from it, in a line. */
  says: ReactNode;
  drawing: ReactNode;
};

type HabitQuestionProps<Value extends string> = {
  question: string;
  /** What goes wrong when it is answered wrongly. */
  why: ReactNode;
  choices: readonly HabitChoice<Value>[];
  /** How to find out. */
  help: ReactNode;
  answer: Value | undefined;
  onAnswer: (value: Value) => void;
};

/** One sign habit of the source, asked with two drawings. Nothing is chosen beforehand. */
export function HabitQuestion<Value extends string>(props: HabitQuestionProps<Value>) {
  const { question, why, choices, help, answer, onAnswer } = props;
  const name = useId();
  return (
    <fieldset className="min-w-0 border-t border-line pt-3 first:border-t-0 first:pt-0">
      <legend className="float-left w-full font-semibold">{question}</legend>
      <p id={`${name}-why`} className="clear-both mb-2.5 max-w-prose text-note text-muted">
        {why}
      </p>
      <div className="grid max-w-[640px] grid-cols-2 gap-3 max-sm:gap-2">
        {choices.map(({ value, label, says, drawing }, place) => (
          <label
            key={value}
            className={`flex cursor-pointer flex-col gap-1.5 rounded-control border p-2.5 has-[:focus-visible]:outline-2 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-accent ${answer === value ? 'border-accent bg-accent-soft/50 ring-1 ring-accent' : 'border-edge bg-panel hover:bg-accent-soft/40'}`}
          >
            <span className="flex justify-center">{drawing}</span>
            <span className="flex items-baseline gap-2">
              <input
                type="radio"
                name={name}
                value={value}
                checked={answer === value}
                aria-labelledby={`${name}-${place}-label`}
                aria-describedby={`${name}-why ${name}-${place}`}
                className="accent-accent"
                onChange={() => onAnswer(value)}
              />
              <span id={`${name}-${place}-label`} className="font-medium">
                {label}
              </span>
            </span>
            <span id={`${name}-${place}`} className="text-note text-muted">
              {says}
            </span>
          </label>
        ))}
      </div>
      <details className="mt-2 max-w-prose text-note">
        <summary className="w-fit text-accent">I do not know: how to find out</summary>
        <div className="mt-1.5 flex flex-col gap-1.5 text-muted">{help}</div>
      </details>
    </fieldset>
  );
}
