import { useId, useRef, useState } from 'react';
import type { KeyboardEvent } from 'react';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { controlLook } from '../../../components/controlLook.ts';
import { formatFormula, formatRange } from '../../../lib/format.ts';
import { searchMaterials } from '../model/materialSearch.ts';
import { classFill, magnetHatch } from './classColours.ts';

type Props = {
  materials: readonly MaterialSummary[];
  chosen: string | undefined;
  onChoose: (material: MaterialSummary) => void;
};

/** The group's library as a list that narrows while one types. */
export function MaterialSearch({ materials, chosen, onChoose }: Props) {
  const [query, setQuery] = useState('');
  const [active, setActive] = useState(0);
  const list = useRef<HTMLUListElement>(null);
  const listId = useId();
  const found = searchMaterials(materials, query);
  const position = Math.min(active, found.length - 1);

  const move = (next: number) => {
    const bounded = Math.min(Math.max(next, 0), found.length - 1);
    setActive(bounded);
    list.current?.children[bounded]?.scrollIntoView?.({ block: 'nearest' });
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown') move(position + 1);
    else if (event.key === 'ArrowUp') move(position - 1);
    else if (event.key === 'Home') move(0);
    else if (event.key === 'End') move(found.length - 1);
    else if (event.key === 'Enter' && found[position]) onChoose(found[position]);
    else return;
    event.preventDefault();
  };

  return (
    <div className="flex flex-col gap-2">
      <input
        data-autofocus
        type="text"
        role="combobox"
        aria-label="Find a material"
        aria-expanded="true"
        aria-controls={listId}
        aria-activedescendant={found[position] ? `${listId}-${position}` : undefined}
        aria-autocomplete="list"
        autoComplete="off"
        placeholder="Find by formula, name or source"
        value={query}
        className={controlLook}
        onChange={(event) => {
          setQuery(event.target.value);
          setActive(0);
        }}
        onKeyDown={onKeyDown}
      />
      <ul
        ref={list}
        id={listId}
        role="listbox"
        aria-label="Materials"
        className="-mx-1.5 max-h-72 overflow-auto"
      >
        {found.map((material, index) => (
          <li
            key={material.id}
            id={`${listId}-${index}`}
            role="option"
            aria-selected={index === position}
            className="cursor-pointer rounded-box px-1.5 py-1.5 aria-selected:bg-accent-soft"
            onPointerMove={() => setActive(index)}
            onClick={() => onChoose(material)}
          >
            <MaterialLine material={material} current={material.id === chosen} />
          </li>
        ))}
      </ul>
      {found.length === 0 && (
        <p className="text-note text-muted">
          {materials.length === 0
            ? 'The library is being loaded.'
            : `Nothing in the library matches “${query}”. Try the formula, or type in constants.`}
        </p>
      )}
    </div>
  );
}

function MaterialLine({ material, current }: { material: MaterialSummary; current: boolean }) {
  return (
    <span className="grid grid-cols-[14px_1fr_auto] items-baseline gap-x-2">
      <span
        aria-hidden="true"
        className="size-3.5 self-center rounded-[3px] border border-line"
        style={{
          background: classFill[material.class],
          backgroundImage: material.voigtRangeNm ? magnetHatch : undefined,
        }}
      />
      <span className="truncate">
        <b className="font-semibold">{formatFormula(material.formula)}</b>{' '}
        <span className="text-muted">{material.name}</span>
        {current && <span className="text-note text-accent"> in use</span>}
      </span>
      <span className="text-small text-muted">{formatRange(material.rangeNm, 'nm')}</span>
      <span className="col-start-2 col-end-4 truncate text-small text-muted">
        {material.class}
        {material.voigtRangeNm ? `, Q ${formatRange(material.voigtRangeNm, 'nm')}` : ''}
        {material.voigtConfidence === 'from memory' ? ' from memory' : ''}, {material.citation}
      </span>
    </span>
  );
}
