'use client';
import { useEffect, useRef } from 'react';
import { CONTROL, FieldFrame, type FieldTexts } from './field';
import { useCombobox, type ComboboxOption, type ComboboxSearch } from './use-combobox';

type ComboboxProps = FieldTexts & {
  search: ComboboxSearch;
  /** Given null when the choice is withdrawn. */
  onChoose: (option: ComboboxOption | null) => void;
  initial?: ComboboxOption | null;
  /** With a name the chosen value is sent with the form around it. */
  name?: string;
  placeholder?: string;
  /** What to do when nothing is found: "Add it under Compounds." */
  nothingFound?: string;
  required?: boolean;
  id?: string;
};

/** Picks one record by typing. The WAI-ARIA combobox pattern with a list box: arrows, Enter, Escape; touch and mouse alike. */
export function Combobox(props: ComboboxProps) {
  const {
    search,
    onChoose,
    initial = null,
    name,
    placeholder,
    nothingFound = 'Nothing found: try another spelling.',
  } = props;
  const box = useCombobox(search, onChoose, initial);
  const listRef = useRef<HTMLUListElement>(null);
  useEffect(() => {
    listRef.current?.querySelector('[aria-selected="true"]')?.scrollIntoView({ block: 'nearest' });
  }, [box.active]);
  const { state, options } = box.found;
  const message =
    state === 'failed'
      ? 'The search did not answer. Check the connection and type again.'
      : state === 'done'
        ? options.length === 0
          ? nothingFound
          : null
        : options.length === 0
          ? 'Searching …'
          : null;

  return (
    <FieldFrame
      label={props.label}
      hint={props.hint}
      error={props.error}
      optional={props.optional}
      id={props.id}
    >
      {(ties) => (
        <div className="relative">
          <input
            {...ties}
            role="combobox"
            type="text"
            autoComplete="off"
            spellCheck={false}
            aria-autocomplete="list"
            aria-expanded={box.open}
            aria-controls={`${ties.id}-list`}
            aria-activedescendant={box.open && box.active >= 0 ? `${ties.id}-${box.active}` : undefined}
            aria-required={props.required || undefined}
            value={box.text}
            placeholder={placeholder}
            onChange={(event) => box.type(event.target.value)}
            onClick={() => box.setOpen(true)}
            onBlur={box.leave}
            onKeyDown={box.onKeyDown}
            className={CONTROL}
          />
          {name ? <input type="hidden" name={name} value={box.chosen?.value ?? ''} /> : null}
          <div
            hidden={!box.open}
            className="absolute inset-x-0 top-full z-30 mt-1 overflow-hidden rounded border border-line-strong bg-paper-raised shadow-lifted"
          >
            <ul
              ref={listRef}
              id={`${ties.id}-list`}
              role="listbox"
              aria-label="Matches"
              className="max-h-72 overflow-y-auto"
            >
              {options.map((option, at) => (
                <li
                  key={option.value}
                  id={`${ties.id}-${at}`}
                  role="option"
                  aria-selected={at === box.active}
                  // Keeps the focus in the input, so that leaving it does not close the list before the press counts.
                  onPointerDown={(event) => event.preventDefault()}
                  onMouseDown={(event) => event.preventDefault()}
                  onPointerMove={() => box.setActive(at)}
                  onClick={() => box.choose(option)}
                  className={`flex min-h-target cursor-pointer flex-col justify-center border-l-4 px-3 py-1 ${
                    at === box.active ? 'border-glass bg-glass-wash' : 'border-transparent'
                  }`}
                >
                  <span className="font-bold">{option.label}</span>
                  {option.detail ? <span className="text-sm text-ink-soft">{option.detail}</span> : null}
                </li>
              ))}
            </ul>
            <p role="status" className={message ? 'px-3 py-3 text-ink-soft' : 'sr-only'}>
              {message ?? `${options.length} ${options.length === 1 ? 'match' : 'matches'}`}
            </p>
          </div>
        </div>
      )}
    </FieldFrame>
  );
}
