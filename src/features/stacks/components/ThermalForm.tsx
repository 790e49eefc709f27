import { useState } from 'react';
import { Link } from 'react-router-dom';
import { describeIssues } from '../../../../shared/issues.ts';
import { layerThermalSchema, magnetizationAt } from '../../../../shared/thermal.ts';
import type { LayerThermal, ThermalLaw } from '../../../../shared/thermal.ts';
import { Button } from '../../../components/Button.tsx';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { parseNumber } from '../../../lib/parseNumber.ts';
import { paths } from '../../../lib/paths.ts';
import { scaleWords } from '../model/thermalWords.ts';

type Props = {
  thermal: LayerThermal | undefined;
  /** The law that the material carries; null when it has none. */
  law: ThermalLaw | null;
  /** Temperature of the sample of which Q is known, as its source says it. */
  knownAt: string | null;
  /** Called with every state that is complete; undefined uses Q as it is known. */
  onChange: (thermal: LayerThermal | undefined) => void;
};

const fields = [
  { key: 'temperatureK', label: 'T (K)' },
  { key: 'referenceK', label: 'Q known at (K)' },
  { key: 'curieK', label: 'Curie T (K)' },
  { key: 'a', label: 'a' },
  { key: 'b', label: 'b' },
] as const;

type Texts = Record<(typeof fields)[number]['key'] | 'citation', string>;

/** Room temperature, at which most samples are measured. */
const ROOM_K = 295;

/** Q of a layer at another temperature, by m(T) = (1 - (T/Tc)^a)^b. Used as soon as every field stands. */
export function ThermalForm({ thermal, law, knownAt, onChange }: Props) {
  const [texts, setTexts] = useState<Texts>(() => textsOf(thermal, law));
  const { value, problems } = judge(texts);
  const change = (key: keyof Texts, text: string) => {
    const next = { ...texts, [key]: text };
    setTexts(next);
    const judged = judge(next);
    if (judged.value) onChange(judged.value);
  };
  return (
    <div className="flex flex-col gap-2.5">
      <div className="grid grid-cols-3 items-end gap-2">
        {fields.map(({ key, label }) => (
          <Field key={key} label={label} error={texts[key].trim() === '' ? undefined : problems[key]}>
            {(control) => (
              <TextInput
                {...control}
                inputMode="decimal"
                autoComplete="off"
                value={texts[key]}
                onChange={(event) => change(key, event.target.value)}
              />
            )}
          </Field>
        ))}
      </div>
      <Field label="Where Tc, a and b come from">
        {(control) => (
          <TextInput
            {...control}
            value={texts.citation}
            placeholder="a citation, or whose they are"
            onChange={(event) => change('citation', event.target.value)}
          />
        )}
      </Field>
      <p role="status" className="text-note">
        {value ? resultWords(value) : missingWords(texts)}
      </p>
      <p className="text-note text-muted">
        <Link className="prose-link" to={`${paths.conventions}#temperature`}>
          m(T) = (1 − (T/Tc)<sup>a</sup>)<sup>b</sup>
        </Link>
        {law && isOf(texts, law) ? ', with the numbers of the material' : ''}.
        {knownAt ? ` The source of Q says ${knownAt}.` : ''}
      </p>
      {thermal && (
        <Button
          className="self-start py-1!"
          onClick={() => {
            onChange(undefined);
            setTexts(textsOf(undefined, law));
          }}
        >
          Use Q as it is known
        </Button>
      )}
    </div>
  );
}

function textsOf(thermal: LayerThermal | undefined, law: ThermalLaw | null): Texts {
  const known = thermal ?? law;
  return {
    temperatureK: thermal ? String(thermal.temperatureK) : '',
    referenceK: String(thermal?.referenceK ?? ROOM_K),
    curieK: known ? String(known.curieK) : '',
    a: known ? String(known.a) : '',
    b: known ? String(known.b) : '',
    citation: known?.citation ?? '',
  };
}

/** Whether the law entered is still that of the material. */
function isOf(texts: Texts, law: ThermalLaw): boolean {
  const own = textsOf(undefined, law);
  return (['curieK', 'a', 'b', 'citation'] as const).every((key) => texts[key] === own[key]);
}

type Judged = { value: LayerThermal | null; problems: Partial<Record<keyof Texts, string>> };

function judge(texts: Texts): Judged {
  const problems: Judged['problems'] = {};
  const numbers = fields.map(({ key }) => {
    const number = parseNumber(texts[key]);
    if (number === null) problems[key] = 'Not a number';
    return [key, number ?? undefined] as const;
  });
  const entered = { ...Object.fromEntries(numbers), citation: texts.citation };
  const read = layerThermalSchema.safeParse(entered);
  if (read.success) return { value: read.data, problems: {} };
  for (const { path, message } of describeIssues(read.error, entered)) {
    const key = fields.find((field) => field.key === path)?.key;
    if (key) problems[key] ??= message;
  }
  return { value: null, problems };
}

function resultWords(thermal: LayerThermal): string {
  const { temperatureK, referenceK } = thermal;
  const at = (kelvin: number) => String(Number(magnetizationAt(kelvin, thermal).toPrecision(3)));
  return (
    `m(${temperatureK} K) = ${at(temperatureK)}, m(${referenceK} K) = ${at(referenceK)}: ` +
    `Q × ${scaleWords(thermal)}.`
  );
}

function missingWords(texts: Texts): string {
  const missing = [
    ...fields.filter(({ key }) => texts[key].trim() === '').map(({ label }) => label),
    ...(texts.citation.trim() === '' ? ['where they come from'] : []),
  ];
  return missing.length > 0
    ? `Still needed: ${missing.join(', ')}.`
    : 'Not used: see the field marked above.';
}
