import type { Look } from './block.ts';

/** Fonts, colours and alignment of one look; colours as the host takes them. */
export interface LookFormat {
  readonly bold?: boolean;
  readonly italic?: boolean;
  readonly size?: number;
  readonly color?: string;
  readonly fill?: string;
  readonly align?: 'Left' | 'Center' | 'Right';
  readonly vertical?: 'Top' | 'Center' | 'Bottom';
  readonly wrap?: boolean;
  /** Steps of indentation. */
  readonly indent?: number;
  /** Colour of a line below. */
  readonly rule?: string;
}

/** Ink, soft ink, rule, amber and washes: the panel's own colours, on a white sheet. */
export const ink = '#17343A';
export const inkSoft = '#4A626A';
export const rule = '#D9D8D0';
export const reading = '#2B6F7C';
export const signal = '#C26D1F';
export const signalInk = '#8A4A10';
export const signalWash = '#F8EBDC';
export const sunken = '#F1EFE8';

export const looks: Readonly<Record<Look, LookFormat>> = {
  title: { bold: true, size: 15, color: ink },
  note: { color: inkSoft, size: 9 },
  section: { bold: true, size: 11, color: signalInk, rule: signal },
  label: { color: ink, size: 10 },
  given: { color: ink, fill: signalWash, size: 10, align: 'Right' },
  value: { color: ink, size: 10, align: 'Right' },
  explanation: { color: inkSoft, size: 9, align: 'Left', indent: 1 },
  header: { bold: true, color: ink, fill: sunken, rule: ink, size: 9, align: 'Center' },
  reading: { color: reading, size: 9, align: 'Right' },
  entry: { color: inkSoft, size: 9, align: 'Right' },
  verdict: { bold: true, color: signalInk, fill: signalWash, size: 11 },
  statement: { color: ink, size: 10, wrap: true, vertical: 'Top' },
  eyebrow: { bold: true, color: signalInk, size: 9 },
  large: { bold: true, color: ink, size: 26, vertical: 'Center' },
  heading: { bold: true, color: ink, size: 11, rule },
  level: { bold: true, color: signalInk, size: 10, vertical: 'Top' },
  date: { color: inkSoft, size: 9, align: 'Right' },
  finding: { color: ink, size: 10, wrap: true, vertical: 'Top' },
};
