import type { SignHabits } from '../../../../shared/materialImport.ts';
import { AxesDrawing } from './AxesDrawing.tsx';
import { HabitQuestion } from './HabitQuestion.tsx';
import { IronKnown } from './IronKnown.tsx';
import { MagnetizationDrawing } from './MagnetizationDrawing.tsx';

type Props = {
  answers: Partial<SignHabits>;
  onAnswer: (answer: Partial<SignHabits>) => void;
};

/** For Kerr angles, which are seen from outside the film. */
export function FilmMagnetization({ answers, onAnswer }: Props) {
  return (
    <HabitQuestion
      question="Where does the positive magnetization of the source point?"
      why="Kerr angles are odd in the magnetization: the other direction is the other sign."
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
            Measured tables often say &ldquo;field toward the light source&rdquo; or &ldquo;parallel to the
            incident light&rdquo;. The direction of a positive field is that of +m, once the sample is
            saturated.
          </p>
          <IronKnown />
        </>
      }
    />
  );
}

/** For Q and tensor elements, which belong to the axes of their tensor. */
export function TensorMagnetization({ answers, onAnswer }: Props) {
  return (
    <HabitQuestion
      question="Along which way of its z axis does the source magnetize the medium?"
      why="What counts is +m against the z axis of the tensor (x, y, z right-handed), not whether that z points into the film or out of it: a tensor stays the same when z and m turn around together."
      answer={answers.magnetization}
      onAnswer={(magnetization) => onAnswer({ magnetization })}
      choices={[
        {
          value: 'into the film',
          label: 'along +z',
          says: 'Q keeps its sign',
          drawing: <AxesDrawing along="+z" />,
        },
        {
          value: 'out of the film',
          label: 'along −z',
          says: 'Q changes its sign',
          drawing: <AxesDrawing along="-z" />,
        },
      ]}
      help={
        <>
          <p>
            Nearly every paper writes its tensor for m along +z, wherever its z points; &ldquo;along −z&rdquo;
            is for a source that draws z into the sample and magnetizes it along the outward normal, or the
            other way round.
          </p>
          <IronKnown />
        </>
      }
    />
  );
}
