import type { ReactNode } from 'react';
import type { SignHabits } from '../../../../shared/materialImport.ts';
import type { HabitName } from '../model/neededHabits.ts';
import { EllipticityDrawing, RotationDrawing } from './BeamViewDrawing.tsx';
import { HabitQuestion } from './HabitQuestion.tsx';
import { MagnetizationDrawing } from './MagnetizationDrawing.tsx';
import { PhasorDrawing } from './PhasorDrawing.tsx';
import { TensorDrawing } from './TensorDrawing.tsx';

type HabitQuestionsProps = {
  needed: readonly HabitName[];
  answers: Partial<SignHabits>;
  onAnswer: (answer: Partial<SignHabits>) => void;
};

/** The habits that matter for the chosen columns, each asked; none is guessed. */
export function HabitQuestions({ needed, answers, onAnswer }: HabitQuestionsProps) {
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
        <Question key={name} name={name} answers={answers} onAnswer={onAnswer} />
      ))}
    </div>
  );
}

/** Fe at 632.8 nm from N = 2.87 + 3.36i and Q = 0.0376 + 0.0066i: Zak et al., Phys. Rev. B 43, 6423 (1991). */
const ironKnown = (
  <p>
    A sample that is known settles it: bulk iron at 632.8 nm and normal incidence, magnetized into the film,
    has a rotation near +0.33° and an ellipticity near +0.36° in the signs of this program (from constants of
    Zak et al., Phys. Rev. B 43, 6423 (1991)). If the same source reports iron with the other sign, take the
    other choice here.
  </p>
);

const looking = 'You look from the detector toward the sample, so that the reflected beam comes at you.';

function Question({ name, answers, onAnswer }: Omit<HabitQuestionsProps, 'needed'> & { name: HabitName }) {
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
              {ironKnown}
            </>
          }
        />
      );
    case 'magnetization':
      return (
        <HabitQuestion
          question="Where does the positive magnetization of the source point?"
          why="Magneto-optic constants are odd in the magnetization: the other direction is the other sign."
          answer={answers.magnetization}
          onAnswer={(magnetization) => onAnswer({ magnetization })}
          choices={[
            {
              value: 'into the film',
              label: 'into the film',
              says: 'along the light that arrives',
              drawing: <MagnetizationDrawing points="into the film" />,
            },
            {
              value: 'out of the film',
              label: 'out of the film',
              says: 'toward the light source',
              drawing: <MagnetizationDrawing points="out of the film" />,
            },
          ]}
          help={
            <>
              <p>
                Look for the z axis of the source: into the sample or along the outward normal. Measured
                tables often say &ldquo;field toward the light source&rdquo; or &ldquo;parallel to the
                incident light&rdquo;.
              </p>
              {ironKnown}
            </>
          }
        />
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
      {ironKnown}
    </>
  );
}
