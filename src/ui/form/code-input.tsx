// A case code, one cell a character with gaps between its groups. One real field lies over the cells, so that pasting,
// phone keyboards and readers work as in any field; the next cell carries the focus border.
import clsx from 'clsx';
import { useRef, useState, type PointerEvent, type Ref } from 'react';
import { Field, type FieldWords } from './field';

interface CodeInputProps extends Omit<FieldWords, 'hint'> {
  readonly value: string;
  /** Capitals without spaces; `?` stands for a character that is lost. */
  readonly onChange: (code: string) => void;
  /** How many characters each group has: [4, 2, 2, 5, 2]. */
  readonly groups: readonly number[];
  /** Reads back in words what is typed so far. */
  readonly readBack?: string;
  /** Indexes of characters nobody is sure of. */
  readonly doubtful?: readonly number[];
  readonly onBlur?: () => void;
  readonly name?: string;
  readonly id?: string;
  readonly ref?: Ref<HTMLInputElement>;
}

const clean = (text: string, length: number): string =>
  text
    .toUpperCase()
    .replace(/[^0-9A-Z?]/g, '')
    .slice(0, length);

/** Indexes at which a new group begins, without the first. */
function groupStarts(groups: readonly number[]): ReadonlySet<number> {
  const starts = new Set<number>();
  let at = 0;
  for (const length of groups) {
    if (at > 0) starts.add(at);
    at += length;
  }
  return starts;
}

export function CodeInput(props: CodeInputProps) {
  const { value, onChange, groups, readBack, doubtful = [], onBlur, name, id, ref, ...words } = props;
  const length = groups.reduce((sum, group) => sum + group, 0);
  const starts = groupStarts(groups);
  const cells = useRef<HTMLSpanElement>(null);
  const [caret, setCaret] = useState(value.length);

  /** A tap lands on a drawn cell, so the real field's caret is put at that character. */
  function placeCaret(event: PointerEvent<HTMLInputElement>) {
    const hit = [...(cells.current?.children ?? [])].findIndex((cell) => {
      const box = cell.getBoundingClientRect();
      return event.clientX <= box.right + 3 && event.clientY >= box.top && event.clientY <= box.bottom + 6;
    });
    const at = Math.min(hit === -1 ? value.length : hit, value.length);
    event.currentTarget.setSelectionRange(at, Math.min(at + 1, value.length));
    setCaret(at);
  }
  return (
    <Field {...words} name={name} id={id} hint={<span aria-live="polite">{readBack}</span>}>
      {(control) => (
        <div className="cells-box">
          <input
            {...control}
            ref={ref}
            name={name}
            type="text"
            inputMode="text"
            autoCapitalize="characters"
            autoComplete="off"
            spellCheck={false}
            value={value}
            onChange={(event) => {
              const code = clean(event.target.value, length);
              setCaret(Math.min(event.target.selectionStart ?? code.length, code.length));
              onChange(code);
            }}
            onSelect={(event) => setCaret(event.currentTarget.selectionStart ?? value.length)}
            onPointerUp={placeCaret}
            onBlur={onBlur}
          />
          <span className="cells" ref={cells} aria-hidden="true">
            {Array.from({ length }, (_, index) => (
              <span
                key={index}
                className={clsx(
                  starts.has(index) && 'cell-first',
                  index >= value.length && 'cell-empty',
                  doubtful.includes(index) && 'cell-doubtful',
                  index === Math.min(caret, length - 1) && 'cell-next',
                )}
              >
                {value[index]}
              </span>
            ))}
          </span>
        </div>
      )}
    </Field>
  );
}
