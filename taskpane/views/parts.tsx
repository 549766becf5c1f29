import type { ComponentChildren } from 'preact';
import { useId, useState } from 'preact/hooks';

/** A section of the panel with its heading. */
export function Section(props: {
  readonly id: string;
  readonly title: string;
  readonly children: ComponentChildren;
}) {
  const heading = `${props.id}-title`;
  return (
    <section class="section" id={props.id} aria-labelledby={heading}>
      <h2 id={heading} tabIndex={-1}>
        {props.title}
      </h2>
      {props.children}
    </section>
  );
}

/** A part of a section with a smaller heading. */
export function Part(props: {
  readonly title: string;
  readonly kind?: string;
  readonly children: ComponentChildren;
}) {
  const id = useId();
  return (
    <section class={`part ${props.kind ?? ''}`} aria-labelledby={id}>
      <h3 id={id}>{props.title}</h3>
      {props.children}
    </section>
  );
}

/** A text input that hands over its text when the user has finished it, with its label and what is wrong with it. */
export function Field(props: {
  readonly label: string;
  readonly value: string;
  readonly hint?: string;
  readonly problem?: string | undefined;
  readonly placeholder?: string;
  readonly math?: boolean;
  readonly onCommit: (text: string) => void;
}) {
  const id = useId();
  // What is being typed stays until the value itself changes, however often the panel is drawn meanwhile.
  const [draft, setDraft] = useState({ over: props.value, text: props.value });
  const text = draft.over === props.value ? draft.text : props.value;
  const type = (typed: string): void => setDraft({ over: props.value, text: typed });
  const told = props.problem !== undefined && props.problem !== '';
  const described = [told ? `${id}-problem` : '', props.hint ? `${id}-hint` : ''].filter(Boolean).join(' ');
  return (
    <div class="field">
      <label for={id}>{props.label}</label>
      <input
        id={id}
        type="text"
        class={props.math ? 'math' : undefined}
        autocomplete="off"
        spellcheck={false}
        value={text}
        placeholder={props.placeholder}
        aria-invalid={told ? 'true' : undefined}
        aria-describedby={described || undefined}
        onInput={(event) => type(event.currentTarget.value)}
        onChange={(event) => props.onCommit(event.currentTarget.value)}
      />
      {props.hint && (
        <p class="hint" id={`${id}-hint`}>
          {props.hint}
        </p>
      )}
      {told && (
        <p class="wrong" id={`${id}-problem`}>
          {props.problem}
        </p>
      )}
    </div>
  );
}

/** A native list of choices with its label. */
export function Choose(props: {
  readonly label: string;
  readonly value: string;
  readonly options: readonly (readonly [value: string, text: string])[];
  readonly onChoose: (value: string) => void;
}) {
  const id = useId();
  return (
    <div class="field">
      <label for={id}>{props.label}</label>
      <select id={id} value={props.value} onChange={(event) => props.onChoose(event.currentTarget.value)}>
        {props.options.map(([value, text]) => (
          <option key={value} value={value} selected={value === props.value}>
            {text}
          </option>
        ))}
      </select>
    </div>
  );
}

/** A native tick with its label. */
export function Tick(props: {
  readonly label: string;
  readonly ticked: boolean;
  readonly disabled?: boolean;
  readonly onTick: (ticked: boolean) => void;
}) {
  return (
    <label class="tick">
      <input
        type="checkbox"
        checked={props.ticked}
        disabled={props.disabled}
        onChange={(event) => props.onTick(event.currentTarget.checked)}
      />
      <span>{props.label}</span>
    </label>
  );
}
