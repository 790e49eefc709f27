import type { CapCandidate } from '../../shared/capDesign.ts';
import type { DesignInput } from '../../shared/design.ts';
import type { Demands, PointReadingName, SignalName } from '../../shared/designPoint.ts';
import { layerNames } from '../../shared/layerNames.ts';
import type { GoalQuantity } from '../../shared/optimiseDesign.ts';
import type { StackDocument, StackMedium } from '../../shared/stack.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';
import type { NamedMaterials } from './runNames.ts';

/** What things of a design question are called in sentences and column titles. */

export const signalWords: Record<SignalName, string> = {
  rotation: 'Kerr rotation',
  ellipticity: 'Kerr ellipticity',
  amplitude: 'cross-polarized amplitude',
  contrast: 'transverse contrast',
};

export const goalWords: Record<GoalQuantity, { words: string; unit: string }> = {
  rotation: { words: 'greatest |Kerr rotation|', unit: 'deg' },
  ellipticity: { words: 'greatest |Kerr ellipticity|', unit: 'deg' },
  amplitude: { words: 'greatest cross-polarized amplitude', unit: '1' },
  contrast: { words: 'greatest |transverse contrast|', unit: '1' },
  'zero ellipticity': { words: 'least |Kerr ellipticity|', unit: 'deg' },
  insensitivity: { words: 'least relative change of the rotation per nm of a layer', unit: '1/nm' },
  'least reflectance': { words: 'least reflectance', unit: '1' },
};

export const readingTitles: Record<PointReadingName, { title: string; unit: string }> = {
  rotationDeg: { title: 'Kerr rotation', unit: 'deg' },
  ellipticityDeg: { title: 'Kerr ellipticity', unit: 'deg' },
  amplitude: { title: 'Cross-polarized amplitude', unit: '1' },
  contrast: { title: 'Transverse contrast', unit: '1' },
  reflectance: { title: 'Reflectance', unit: '1' },
  ceilingShare: { title: 'Share of the ceiling', unit: '1' },
};

/** The demands that are made, each as words such as "|rotation| at least 0.1 deg". */
export function demandWords(demands: Demands): string[] {
  const words: Record<keyof Demands, (limit: number) => string> = {
    leastRotationDeg: (limit) => `|rotation| at least ${limit} deg`,
    leastAmplitude: (limit) => `cross-polarized amplitude at least ${limit}`,
    leastContrast: (limit) => `|transverse contrast| at least ${limit}`,
    leastReflectance: (limit) => `reflectance at least ${limit}`,
    mostEllipticityDeg: (limit) => `|ellipticity| at most ${limit} deg`,
    mostSlopePercentPerNm: (limit) => `change of the signal at most ${limit} % per nm of the cap`,
  };
  const names = Object.keys(words) as (keyof Demands)[];
  return names.flatMap((name) => (demands[name] === undefined ? [] : [words[name](demands[name])]));
}

export function mediumName({ label, material }: StackMedium, materials: NamedMaterials): string {
  return (
    label ?? materials.find(({ id }) => id === material)?.formula ?? material ?? 'a medium given by numbers'
  );
}

/** Such as "Pt (cap)"; see `layerNames`. */
export function layerName(layerId: string, document: StackDocument, materials: NamedMaterials): string {
  const names = layerNames(drawnLayers(document.layers), (medium) => mediumName(medium, materials));
  return names.get(layerId) ?? layerId;
}

/** Such as "SiO2 swept on TiN 2 nm". */
export function candidateInWords({ layers }: CapCandidate, materials: NamedMaterials): string {
  const words = layers.map(({ medium, fixedNm, leastNm, leastSource }) => {
    const thickness = fixedNm === null ? 'swept' : `${fixedNm} nm`;
    const source = leastSource === '' ? '' : `, ${leastSource}`;
    return `${mediumName(medium, materials)} ${thickness} (protects from ${leastNm} nm${source})`;
  });
  return words.join(' on ');
}

/** The name of a design whose maker gave none. */
export function designNameFor(
  design: DesignInput,
  materials: NamedMaterials,
  stackName: string | null,
): string {
  const question = questionOf();
  const alone = question.charAt(0).toUpperCase() + question.slice(1);
  const name = stackName === null ? alone : `${stackName}: ${question}`;
  return name.slice(0, 120);

  function questionOf(): string {
    switch (design.kind) {
      case 'cap':
        return `cap of ${design.candidates.map(({ label }) => label).join(', ')}`;
      case 'optimise': {
        const layers = design.variables.map(({ layerId }) => layerName(layerId, design.document, materials));
        return `${goalWords[design.goal.quantity].words} by ${layers.join(', ')}`;
      }
      case 'tolerance':
        return `tolerance in ${design.tolerance.samples} films`;
    }
  }
}
