import { Fragment, type ReactNode } from 'react';

const numerals = /([\d$][\d:.,–−+-]*)/;

/** Takes a comma, period or colon that belongs to the sentence off the end of a numeral. */
function split(part: string): [string, string] {
  const found = /^(.*?)([.,:]?)$/.exec(part);
  return [found?.[1] ?? part, found?.[2] ?? ''];
}

/** Sets the numerals of a text in Mono and the words between them in Sans: `<Numeral text="9:00–11:00 am" />`. */
export function Numeral({ text }: { text: string | number }): ReactNode {
  return String(text)
    .split(numerals)
    .map((part, index) => {
      if (index % 2 === 0) return <Fragment key={index}>{part}</Fragment>;
      const [digits, rest] = split(part);
      return (
        <Fragment key={index}>
          <span className="n">{digits}</span>
          {rest}
        </Fragment>
      );
    });
}

/** A measure: the numeral in Mono, its unit in Sans, never parted by a line break. */
export function Measure({ value, unit }: { value: string | number; unit: string }): ReactNode {
  return (
    <span className="nw">
      <span className="n">{value}</span> {unit}
    </span>
  );
}
