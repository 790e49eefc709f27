import type { ReactNode } from 'react';
import type { SignHabits } from '../../../../shared/materialImport.ts';
import type { HabitName } from '../model/neededHabits.ts';
import { EllipticityDrawing, RotationDrawing } from './BeamViewDrawing.tsx';
import { HabitQuestion } from './HabitQuestion.tsx';
import { IronKnown } from './IronKnown.tsx';
import { FilmMagnetization, TensorMagnetization } from './MagnetizationQuestions.tsx';
import { PhasorDrawing } from './PhasorDrawing.tsx';
import { TensorDrawing } from './TensorDrawing.tsx';

type HabitQuestionsProps = {
  needed: readonly HabitName[];
  /** The columns hold Q or an element of a tensor, not Kerr angles. */
  ofTensor: boolean;
  answers: Partial<SignHabits>;
  onAnswer: (answer: Partial<SignHabits>) => void;
};

/** The habits that matter for the chosen columns, each asked; none is guessed. */
export function HabitQuestions({ needed, ...rest }: HabitQuestionsProps) {
  if (needed.length === 0) {
    return (
      <p className="text-muted">
        Nothing in these columns depends on a sign habit: real n without k is the same in all of them.
      </p>
    );
  }
  return (
    <div className="flex flex-col gap-5">
      <p className="max-w-prose text-muted">
        Sources differ in these signs and files do not say which they use, so nothing is chosen for you. A
        wrong choice gives a Kerr angle of the wrong sign or size and no error. The paper that the table comes
        from is the place to look.
      </p>
      {needed.map((name) => (
        <Question key={name} name={name} {...rest} />
      ))}
    </div>
  );
}

const looking = 'You look from the detector toward the sample, so that the reflected beam comes at you.';

function Question({
  name,
  ofTensor,
  answers,
  onAnswer,
}: Omit<HabitQuestionsProps, 'needed'> & { name: HabitName }) {
  switch (name) {
    case 'time':
      return (
        <HabitQuestion
          question="Which time factor does the source use?"
          why="It sets the sign of every imaginary part, and with it whether the medium absorbs or would amplify. The field turns in the complex plane as drawn; the wave fades in both."
          answer={answers.time}
          onAnswer={(time) => onAnswer({ time })}
          choices={[
            {
              value: 'exp(-iwt)',
              label: 'exp(−iωt)',
              says: 'clockwise; an absorber has N = n + ik, ε₂ > 0',
              drawing: <PhasorDrawing time="exp(-iwt)" />,
            },
            {
              value: 'exp(+iwt)',
              label: 'exp(+iωt)',
              says: 'counter-clockwise; an absorber has N = n − ik, ε₂ < 0',
              drawing: <PhasorDrawing time="exp(+iwt)" />,
            },
          ]}
          help={
            <>
              <p>
                Look for N = n + ik or N = n − ik, for exp i(kz − ωt) or exp i(ωt − kz), or for j in place of
                i (then nearly always exp(+jωt)).
              </p>
              <p>
                Or look at the numbers: every absorber has Im N above 0 with exp(−iωt) and below 0 with
                exp(+iωt). If the next step refuses negative k, take the other choice.
              </p>
              <p>
                A k or ε₂ that is written without its sign, as in N = n − ik with k = 3.4, is understood for
                both; the result says how it was read.
              </p>
            </>
          }
        />
      );
    case 'voigtSign':
      return (
        <HabitQuestion
          question="Which sign stands before Q in the tensor?"
          why="The element in row x and column y, for a magnetization along +z. The other sign turns every rotation and ellipticity around."
          answer={answers.voigtSign}
          onAnswer={(voigtSign) => onAnswer({ voigtSign })}
          choices={[
            {
              value: '+iQ',
              label: (
                <>
                  ε<sub>xy</sub> = +iQε<sub>d</sub>
                </>
              ),
              says: 'Q is taken with this sign',
              drawing: <TensorDrawing sign="+iQ" />,
            },
            {
              value: '-iQ',
              label: (
                <>
                  ε<sub>xy</sub> = −iQε<sub>d</sub>
                </>
              ),
              says: 'Q changes its sign',
              drawing: <TensorDrawing sign="-iQ" />,
            },
          ]}
          help={
            <>
              <p>Find where the source writes its tensor; the sign at row x, column y is the answer.</p>
              <IronKnown />
            </>
          }
        />
      );
    case 'magnetization':
      return ofTensor ? (
        <TensorMagnetization answers={answers} onAnswer={onAnswer} />
      ) : (
        <FilmMagnetization answers={answers} onAnswer={onAnswer} />
      );
    case 'rotation':
      return (
        <HabitQuestion
          question="Looking into the reflected beam, how does a positive rotation turn?"
          why={looking}
          answer={answers.rotation}
          onAnswer={(rotation) => onAnswer({ rotation })}
          choices={turns((turn) => (
            <RotationDrawing turns={turn} />
          ))}
          help={<TurnHelp />}
        />
      );
    case 'ellipticity':
      return (
        <HabitQuestion
          question="Looking into the reflected beam, how does the field turn at positive ellipticity?"
          why={`${looking} The tip of the field runs along the ellipse as drawn.`}
          answer={answers.ellipticity}
          onAnswer={(ellipticity) => onAnswer({ ellipticity })}
          choices={turns((turn) => (
            <EllipticityDrawing turns={turn} />
          ))}
          help={<TurnHelp />}
        />
      );
  }
}

function turns(drawing: (turn: SignHabits['rotation']) => ReactNode) {
  return [
    {
      value: 'counter-clockwise' as const,
      label: 'counter-clockwise',
      says: 'as in this program',
      drawing: drawing('counter-clockwise'),
    },
    {
      value: 'clockwise' as const,
      label: 'clockwise',
      says: 'the sign is changed',
      drawing: drawing('clockwise'),
    },
  ];
}

function TurnHelp() {
  return (
    <>
      <p>
        A source that looks along the beam, from the sample toward the detector, sees the opposite sense: its
        clockwise is counter-clockwise here.
      </p>
      <IronKnown />
    </>
  );
}
